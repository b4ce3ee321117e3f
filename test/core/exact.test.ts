import { exponentOf, magnitude, productError, quotient, quotientRoot, timesPowerOf2 } from "../../src/core/exact";
import { anyDouble, CORNERS, repeatable } from "../support/spreadDoubles";
import { type Big, big, ulpsApart } from "../support/ulps";

const product = (factors: number[]): Big => factors.reduce((result, factor) => result.times(big(factor)), big(1));

test.each([1, 2, 3, 5, 8])(
  "quotients of up to %p factors either way stay within 1 ulp, their roots within 2",
  (most) => {
    const random = repeatable(most);
    const draw = () =>
      Array.from({ length: 1 + Math.floor(random() * most) }, () => Math.min(anyDouble(random), 1.7e308));
    const misses: unknown[] = [];
    for (let i = 0; i < 500; i++) {
      const [up, down] = [draw(), draw()];
      const exact = product(up).div(product(down));
      const pairs = [
        [quotient(up, down), exact, 1],
        [quotientRoot(up, down), exact.sqrt(), 2],
      ] as const;
      for (const [result, wanted, budget] of pairs) {
        const overflow = wanted.gt(big(Number.MAX_VALUE));
        if (overflow ? result !== Infinity : !(ulpsApart(result, wanted) <= budget)) misses.push([up, down, result]);
      }
    }
    expect(misses).toEqual([]);
  },
);

test("a zero among the numerators makes the quotient and its root 0", () => {
  expect(quotient([1e308, 0, 1e308], [5e-324])).toBe(0);
  expect(quotientRoot([0], [5e-324])).toBe(0);
});

test("the exponent brackets its number, subnormal ones too", () => {
  for (const x of CORNERS) {
    const scaled = big(x).div(big(2).pow(exponentOf(x)));
    expect(scaled.gte(1) && scaled.lt(2)).toBe(true);
  }
});

test("multiplying by a power of 2 rounds once, into the subnormal numbers and out of them", () => {
  for (const x of CORNERS) {
    for (const n of [-2200, -1074, -1022, -960, -500, -1, 0, 1, 500, 1023, 2046, 2097]) {
      const exact = big(x).times(big(2).pow(n));
      if (exact.lte(big(Number.MAX_VALUE))) expect(ulpsApart(timesPowerOf2(x, n), exact)).toBeLessThanOrEqual(0.5);
      else expect(timesPowerOf2(x, n)).toBe(Infinity);
    }
  }
});

test("the rounding error of a product is exact", () => {
  const random = repeatable(3);
  for (let i = 0; i < 200; i++) {
    const [a, b] = [random() * 10, random() / 10];
    expect(
      big(a * b)
        .plus(big(productError(a, b, a * b)))
        .eq(big(a).times(big(b))),
    ).toBe(true);
  }
});

test("magnitudes stay within 2 ulp where squares overflow or vanish", () => {
  for (const x of CORNERS) {
    for (const y of [0, ...CORNERS]) {
      const exact = big(x).pow(2).plus(big(y).pow(2)).sqrt();
      if (exact.lte(big(Number.MAX_VALUE))) expect(ulpsApart(magnitude(-x, y), exact)).toBeLessThanOrEqual(2);
    }
  }
});
