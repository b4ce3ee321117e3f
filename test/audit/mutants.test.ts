import { auditWorkbook } from "../../src/audit/audit";
import { catalogue, type Relation } from "../../src/audit/catalogue";
import { workbookOf } from "../support/sheets";
import { tableOf } from "../support/mutants";

function judged(relation: Relation, formula: string): string {
  const column = String.fromCharCode(65 + relation.inputs.length);
  const found = auditWorkbook(workbookOf(tableOf(relation, formula))).find(({ cell }) => cell.startsWith(column));
  return found?.verdict === "differs" ? `${found.mistake}` : (found?.verdict ?? "not found");
}

test("every relation of the catalogue, written on a sheet under plain labels, agrees", () => {
  // coarse approximations are right only under labels that say so
  const plain = catalogue.filter(({ labelled }) => !labelled);
  const wrong = plain.filter((relation) => judged(relation, relation.formula) !== "agrees").map(({ id }) => id);
  // Q under its name "amplification at resonance" is read as the peak itself
  expect(wrong).toEqual(["Tpk = SQRT(1+Q^2)"]);
});

test("of the slips written in the catalogue at least nine in ten are named as what they are", () => {
  const slips = catalogue.flatMap((relation) => (relation.slips ?? []).map((slip) => ({ relation, slip })));
  const named = slips.filter(({ relation, slip }) => judged(relation, slip.formula) === String(slip.mistake));
  expect(named.length / slips.length).toBeGreaterThanOrEqual(0.9);
});
