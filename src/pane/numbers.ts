/** Numbers as the user's locale writes them, to the digits that help. */
export interface Numbers {
  /** about four significant digits; very large and small ones as powers of ten */
  short(value: number): string;
  /** up to fifteen significant digits, as the sheet holds it */
  exact(value: number): string;
  /** a fraction as percent */
  percent(value: number): string;
}

export function numbersFor(locale: string): Numbers {
  const language = known(locale);
  const shortFormat = new Intl.NumberFormat(language, { maximumSignificantDigits: 4, useGrouping: false });
  const exactFormat = new Intl.NumberFormat(language, { maximumSignificantDigits: 15, useGrouping: false });
  const power = new Intl.NumberFormat(language, { maximumSignificantDigits: 4, notation: "scientific" });
  const percentFormat = new Intl.NumberFormat(language, { style: "percent", maximumSignificantDigits: 3 });
  const extreme = (value: number): boolean => value !== 0 && (Math.abs(value) >= 1e7 || Math.abs(value) < 1e-4);
  return {
    short: (value) => (extreme(value) ? power : shortFormat).format(value),
    exact: (value) => (extreme(value) ? power : exactFormat).format(value),
    percent: (value) => percentFormat.format(value),
  };
}

function known(locale: string): string | undefined {
  try {
    return Intl.getCanonicalLocales(locale)[0];
  } catch {
    return undefined;
  }
}
