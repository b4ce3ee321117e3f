import { DEFAULT_LOCALE, helpers } from "@odoo/o-spreadsheet";

const readsOtherwise = (text: string): boolean =>
  helpers.isFormula(text) ||
  helpers.isNumber(text, DEFAULT_LOCALE) ||
  helpers.isDateTime(text, DEFAULT_LOCALE) ||
  /^(['#]|true$|false$)/i.test(text);

/** Cell content that stays this text, even where it would read as a number, a date or a formula. */
export const asText = (text: string): string => (readsOtherwise(text) ? `'${text}` : text);
