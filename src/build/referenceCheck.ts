/** What CHECK can check, for its section of the reference page. */
import { checkables, type CheckableQuantity, inputsOf } from "../audit/checkables";
import { escape, table } from "./html";

export function checkTable(): string {
  const rows = (Object.keys(checkables) as CheckableQuantity[]).map((quantity) => {
    const { labels, least } = inputsOf(quantity);
    const inputs = labels.map((label, i) => (i < least ? label : `[${label}]`)).join(", ");
    return [`<code>${quantity}</code>`, escape(inputs)];
  });
  return table("Quantities that CHECK knows", ["Quantity", "Inputs in this order, SI units"], rows);
}
