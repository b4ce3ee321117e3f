/** The relations behind the cell functions, typeset from the audit's catalogue. */

export interface RelationDoc {
  says: string;
  /** a MathML element */
  mathml: string;
  /** what each symbol stands for, the symbol as HTML */
  symbols: { symbol: string; meaning: string }[];
}

/** The relations that the function `id` computes; none where its result has no closed form. */
export function relationsOf(_id: string): RelationDoc[] {
  return [];
}
