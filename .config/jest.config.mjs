// Modules published only as ES modules are transformed like our own.
const esModules = [
  "mathjs",
  "@borgar/fx",
  "odex",
  "fast-check",
  "pure-rand",
  "temml",
  "@formulajs/formulajs",
  "fflate",
].join("|");

export default {
  rootDir: "..",
  testEnvironment: "node",
  globalSetup: "<rootDir>/test/support/tools.ts",
  testTimeout: 120_000, // browsers on slow machines; no test asserts a time
  testMatch: ["<rootDir>/test/**/*.test.ts"],
  transform: {
    "\\.[jt]s$": [
      "@swc/jest",
      { jsc: { parser: { syntax: "typescript" }, target: "es2022" }, module: { type: "commonjs" } },
    ],
  },
  transformIgnorePatterns: [`/node_modules/(?!(?:${esModules})/)`],
};
