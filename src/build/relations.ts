/** The relations behind the cell functions, typeset from the audit's catalogue. */
import temml from "temml";
import { catalogue } from "../audit/catalogue/index";
import { type Role, roles } from "../audit/roles";
import { latexOf } from "../audit/typeset";

export interface RelationDoc {
  says: string;
  /** a MathML element */
  mathml: string;
  /** what each symbol stands for, the symbol as MathML */
  symbols: { symbol: string; meaning: string }[];
}

/** The relations that the function `id` computes; none where its result has no closed form. */
export function relationsOf(id: string): RelationDoc[] {
  return catalogue
    .filter(({ cellFunction }) => cellFunction === id)
    .map(({ says, out, formula, inputs }) => ({
      says,
      mathml: temml.renderToString(`${latex(out)}=${latex(formula)}`, { displayMode: true }),
      symbols: [out, ...inputs].map((role) => ({ symbol: temml.renderToString(latex(role)), meaning: meaning(role) })),
    }));
}

function latex(formula: string): string {
  const text = latexOf(formula);
  if (text === null) throw new Error(`cannot typeset ${formula}`);
  return text;
}

function meaning(role: Role): string {
  return roles[role].says;
}
