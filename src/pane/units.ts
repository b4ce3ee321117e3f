/** The unit in which an argument or result stands, from the function's own words and the unit system that it was given. */
const SYSTEMS = ["si", "mm", "inch"];

/** "m/s2" as "m/s²", "N.s/m" as "N·s/m". */
const printed = (unit: string): string =>
  unit.replace(/(?<=[A-Za-z)])2/g, "²").replace(/(?<=[A-Za-z])\.(?=[A-Za-z])/g, "·");

/** "N/m, N/mm or lbf/in" with `mm` is "N/mm"; "" where the text names no one unit. */
export function unitIn(text: string, system: string): string {
  const index = SYSTEMS.indexOf(system);
  const plain = text.trim();
  if (plain.startsWith("degrees")) return "°";
  if (/^(any|same|unit of|that unit|word|count|no unit|fraction|text|shape)\b/.test(plain)) return "";
  const later = /^(.*?),? or (\S+) for mm and inch$/.exec(plain);
  if (later) return printed(index > 0 ? later[2]! : later[1]!);
  const units = plain.split(/,\s+or\s+|,\s+|\s+or\s+/);
  if (units.some((unit) => /\s/.test(unit))) return "";
  if (units.length === 3) return printed(units[Math.max(index, 0)]!);
  if (units.length === 2) return printed(index === 2 ? units[1]! : units[0]!);
  return units.length === 1 ? printed(units[0]!) : "";
}

/** The unit part of a text such as "Static deflection; m, mm or in; shape of the arguments together." */
export const resultUnit = (returns: string, system: string): string => unitIn(returns.split("; ")[1] ?? "", system);
