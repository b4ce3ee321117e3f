import { CellFailure } from "./failure";
import { type Argument, lift, one, word } from "./cell";

/** Relative tolerance when none, or 0, is given. */
const USUAL_TOLERANCE = 0.001;

/**
 * Verdict on a hand-made value: agrees, or the known mistake that gives it, or the value that was expected.
 * @customfunction CHECK
 * @param handValue Value that the sheet found by hand; SI unit of the quantity, fraction, dB or degrees; any. Number or range.
 * @param quantity What it should be; word; such as absolute-transmissibility or natural-frequency, listed on the help page.
 * @param [tolerance] Relative difference still taken as agreement; fraction; above 0, below 1. One number. Left out: 0.001.
 * @param inputs The quantity's inputs in their order; SI units; as listed on the help page. Number or range.
 * @returns Text: the verdict; no unit; shape of handValue and inputs together.
 * @example =CHECK(0.134190254899201, "absolute-transmissibility", , 25, 8, 0.1) gives "agrees"
 * @example =LEFT(CHECK(0.113793, "absolute-transmissibility", , 25, 8, 0.1), 25) gives "numerator-damping-missing"
 * @failure wrong-shape when the quantity takes another number of inputs
 * @source The relations and slips of the audit's catalogue, the right value from the cell functions
 * @leavesOut It knows the value and the inputs, not the formula: two mistakes that give one number are both named.
 */
export async function CHECK(
  handValue: any[][],
  quantity: string,
  tolerance: any[][],
  inputs: any[][][],
): Promise<any[][]> {
  const [{ checkValue }, { checkables, inputsOf }] = await Promise.all([
    import("../audit/check"),
    import("../audit/checkables"),
  ]);
  const names = Object.keys(checkables) as (keyof typeof checkables)[];
  const chosen = word("quantity", quantity, names);
  const relative = one("tolerance", tolerance, 0) || USUAL_TOLERANCE;
  if (!(relative > 0 && relative < 1)) {
    throw new CellFailure("outside-domain", `tolerance must be above 0 and below 1, got ${relative}`);
  }
  const { names: wanted, labels, least } = inputsOf(chosen);
  const given = withoutBlankEnd(inputs ?? []);
  if (given.length < least || given.length > wanted.length) {
    const listed = labels.map((label, i) => (i < least ? label : `[${label}]`)).join(", ");
    throw new CellFailure("wrong-shape", `${chosen} takes the inputs ${listed}; got ${given.length}`);
  }
  return lift((hand, ...values) => checkValue(hand, chosen, relative, values.slice(0, given.length)), {
    handValue,
    ...Object.fromEntries(given.map((input, i) => [labels[i], input])),
  });
}

/** Left-out arguments at the end of the list do not count. */
function withoutBlankEnd(inputs: Argument[]): Argument[] {
  const last = inputs.findLastIndex((input) => {
    const cell = Array.isArray(input) ? (input as any)[0]?.[0] : input;
    return !(cell === null || cell === undefined || cell === "");
  });
  return inputs.slice(0, last + 1);
}
