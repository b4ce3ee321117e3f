import { catalogue } from "../../src/audit/catalogue";
import { probes, probeValues } from "../../src/audit/probes";

/** Values of a relation or slip at the probe points. */
function valuesOf(
  inputs: readonly (typeof catalogue)[number]["out"][],
  compute: (values: number[]) => number,
): number[] {
  const columns = inputs.map((role) => probeValues(role, 1));
  return Array.from({ length: probes }, (_, s) => compute(columns.map((column) => column[s]!)));
}

const same = (a: readonly number[], b: readonly number[]): boolean =>
  a.every((value, s) => Math.abs(value / b[s]! - 1) < 1e-9);

test.each(catalogue.map((relation) => [relation.id, relation] as const))(
  "%s has a value at every probe point",
  (_, relation) => {
    for (const value of valuesOf(relation.inputs, relation.compute)) expect(Number.isFinite(value)).toBe(true);
  },
);

test("no two relations of one result and the same inputs are the same formula in two entries", () => {
  const twins: string[] = [];
  catalogue.forEach((one, i) => {
    for (const other of catalogue.slice(i + 1)) {
      if (one.out !== other.out || [...one.inputs].sort().join() !== [...other.inputs].sort().join()) continue;
      if (same(valuesOf(one.inputs, one.compute), valuesOf(other.inputs, other.compute)))
        twins.push(`${one.id} | ${other.id}`);
    }
  });
  expect(twins).toEqual([]);
});

test("every slip written in the catalogue differs from its relation at some probe point", () => {
  const harmless = catalogue.flatMap((relation) =>
    relation.allSlips
      .slice(0, relation.slips?.length ?? 0)
      .filter((slip) => same(valuesOf(relation.inputs, slip.compute), valuesOf(relation.inputs, relation.compute)))
      .map((slip) => `${relation.id}: ${slip.formula}`),
  );
  expect(harmless).toEqual([]);
});

test("every slip and relation says why or what in one sentence", () => {
  for (const relation of catalogue) {
    expect(relation.says).not.toBe("");
    expect(relation.source).not.toBe("");
    for (const slip of relation.allSlips) expect(slip.why).toMatch(/\.$/);
  }
});
