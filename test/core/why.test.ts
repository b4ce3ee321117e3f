import { why, zoneOf } from "../../src/core/why";

const sentence = (f: number, fn: number, zeta: number) => why(f, fn, zeta, "viscous");

test("an isolated point reads as an engineer would write it", () => {
  // T = 0.1342, peak 5.123 at 7.92, T at 0.8 fn = 0.0889: mpmath
  expect(sentence(25, 8, 0.1)).toBe(
    "Isolates: at r = 3.13 the item moves 0.134 times as much as its base (86.6 % isolation); that is 2.21 times " +
      "√2·fn = 11.3, where isolation begins; the peak at resonance is 5.12 times, at 7.92; a natural frequency 20 % " +
      "lower would help most, to 0.0889 times.",
  );
});

test.each([
  [2, 8, 0.1, "follows the base", "well below resonance"],
  [6, 8, 0.02, "amplifies", "beside resonance"],
  [11.2, 8, 0.01, "amplifies", "just below sqrt 2 fn it moves about as much, but against its base"],
  [9.6, 8, 5, "follows the base", "a stiff damper carries the item along"],
  [25, 8, 0.1, "isolates", "above sqrt 2 fn"],
])("at %p over %p with zeta %p the mount %s: %s", (f, fn, zeta, zone) => {
  expect(sentence(f, fn, zeta).toLowerCase().startsWith(`${zone}:`)).toBe(true);
});

test("sqrt 2 itself isolates, the place below does not", () => {
  expect(zoneOf(Math.SQRT2, 1, 2)).toBe("isolates");
  expect(zoneOf(1.414213562373095, 1, 2)).toBe("amplifies");
});

test.each([
  [1500, 8, 0.1, "rpm for Hz"],
  [0.1, 8, 0.1, "rpm for Hz"],
  [8, 8, 0.1, "twice the damping"],
  [25, 8, 3, "half the damping would help most"],
  [12, 8, 0, "without damping nothing bounds the motion"],
  [800, 8, 0, "(more than 99.9 % isolation)"],
  [8 * Math.SQRT2, 8, 0.1, "(less than 0.1 % isolation)"],
  [0, 8, 0.1, "a base at rest or in slow motion carries the item along"],
])("at %p over %p with zeta %p it says: %s", (f, fn, zeta, part) => {
  expect(sentence(f, fn, zeta)).toContain(part);
});

test("an ordinary ratio raises no doubt about units", () => {
  expect(sentence(25, 8, 0.1)).not.toContain("rpm");
});

test("undamped resonance is a pole, and numbers too large to print are refused", () => {
  expect(() => sentence(8, 8, 0)).toThrow(expect.objectContaining({ kind: "pole" }));
  expect(() => sentence(1e308, 1.5e308, 0.1)).toThrow(expect.objectContaining({ kind: "overflow" }));
  expect(() => sentence(1e308, 1e-308, 0.1)).toThrow(expect.objectContaining({ kind: "overflow" }));
});
