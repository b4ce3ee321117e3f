/** Repeatable doubles from every corner of their range. */

/** Ends, powers and neighbours at which formulas of this field go wrong. */
export const CORNERS = [
  5e-324,
  1e-320,
  2.2250738585072014e-308,
  1e-200,
  1e-100,
  1e-9,
  0.05,
  0.5,
  0.9999999999999999,
  1,
  1.0000000000000002,
  Math.SQRT2,
  3,
  1e8,
  1e100,
  1e200,
  1.7976931348623157e308,
];

/** Uniform numbers in 0..1 from a linear congruential generator, the same in every run. */
export function repeatable(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}

/** A positive double: everyday size, anywhere in the range, or a corner. */
export function anyDouble(random: () => number): number {
  const kind = random();
  if (kind < 0.35) return 10 ** (random() * 8 - 4);
  if (kind < 0.7) return 10 ** (random() * 616 - 308);
  return CORNERS[Math.floor(random() * CORNERS.length)];
}
