import { damping } from "./damping";
import { helpers } from "./helpers";
import { motion } from "./motion";
import { mounts } from "./mounts";
import { random } from "./random";
import { ratios } from "./ratios";
import type { Relation } from "./relation";

/** Every relation that the audit knows. */
export const catalogue: readonly Relation[] = [...ratios, ...mounts, ...damping, ...motion, ...random, ...helpers];

export type { Relation } from "./relation";
