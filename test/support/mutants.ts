import { type Relation } from "../../src/audit/catalogue";
import { probeValues } from "../../src/audit/probes";
import { type Role, roles } from "../../src/audit/roles";
import { readFormula } from "../../src/formula/read";
import { walk } from "../../src/formula/nodes";

const units: Partial<Record<string, string>> = {
  frequency: "Hz",
  length: "m",
  velocity: "m/s",
  acceleration: "m/s²",
  mass: "kg",
  force: "N",
  stiffness: "N/m",
  damping: "N·s/m",
  angle: "rad",
  level: "dB",
  density: "(m/s²)²/Hz",
  pressure: "N/m²",
  area: "m²",
};

/** A header that names a role plainly, with its SI unit. */
export function headerOf(role: Role): string {
  const { says, dimension } = roles[role];
  const unit = units[dimension];
  return unit ? `${says} [${unit}]` : says;
}

/** A table of three rows whose last column is a relation, or a slip of it, over columns of its inputs. */
export function tableOf(relation: Relation, formula: string): Record<string, string | number> {
  const cells: Record<string, string | number> = {};
  const letter = (i: number): string => String.fromCharCode(65 + i);
  relation.inputs.forEach((role, i) => {
    cells[`${letter(i)}1`] = headerOf(role);
    probeValues(role, 1).forEach((value, row) => (cells[letter(i) + (row + 2)] = Number(value.toPrecision(6))));
  });
  const last = letter(relation.inputs.length);
  cells[`${last}1`] = headerOf(relation.out);
  for (let row = 2; row <= 4; row++) {
    cells[last + row] = `=${withCells(formula, (role) => letter(relation.inputs.indexOf(role)) + row)}`;
  }
  return cells;
}

/** Formula text with cells for the names of roles. */
function withCells(formula: string, cellOf: (role: Role) => string): string {
  const places: { start: number; end: number; role: Role }[] = [];
  walk(readFormula(formula).tree, (node) => {
    if (node.kind === "name") places.push({ start: node.start, end: node.end, role: node.name as Role });
  });
  let text = formula;
  for (const { start, end, role } of places.sort((a, b) => b.start - a.start))
    text = text.slice(0, start) + cellOf(role) + text.slice(end);
  return text;
}
