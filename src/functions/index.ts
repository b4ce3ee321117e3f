/** Every cell function, by family. The name of each is its id. */
export * from "./ratios";
export * from "./mounts";
export * from "./design";
export * from "./conversion";
export * from "./random";
export * from "./shock";
export * from "./systems";
export * from "./check";
