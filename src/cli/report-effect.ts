/** How far off a finding is, and on which side. */
import type { Finding } from "../audit/finding";
import type { Quantity } from "../audit/quantities";

/**
 * The side on which a wrong value makes the installation look better than it is. Quantities that can hurt either way,
 * such as a natural frequency, are left out.
 */
const unsafeSides: Partial<Record<Quantity, { side: "low" | "high"; why: string }>> = {
  "absolute-transmissibility": { side: "low", why: "more isolation is promised than there is" },
  "relative-transmissibility": { side: "low", why: "the mount needs more room than the sheet says" },
  "transmissibility-db": { side: "low", why: "more isolation is promised than there is" },
  "peak-transmissibility": { side: "low", why: "the amplification at resonance is larger than the sheet says" },
  "isolation-efficiency": { side: "high", why: "more isolation is promised than there is" },
  "payload-motion": { side: "low", why: "the item moves more than the sheet says" },
  "relative-displacement": { side: "low", why: "the mount needs more room than the sheet says" },
  "mount-force": { side: "low", why: "the mounts pass more force than the sheet says" },
  "mount-load": { side: "low", why: "the mounts carry more than the sheet says" },
  "random-response-rms": { side: "low", why: "the response is larger than the sheet says" },
  "overall-rms": { side: "low", why: "the vibration is stronger than the sheet says" },
  "required-static-deflection": { side: "low", why: "mounts chosen by it are too stiff" },
  "required-natural-frequency": { side: "high", why: "mounts chosen by it are too stiff" },
  "required-stiffness": { side: "high", why: "mounts chosen by it are too stiff" },
};

/** "up to 48.6 % too low, at E5"; empty where it cannot be said. */
export function effectOf({ maxRelativeError, worstCell, comparison }: Finding): string {
  if (maxRelativeError === null || !Number.isFinite(maxRelativeError)) return "";
  const at = worstCell ? `, at ${worstCell}` : "";
  const worst = comparison.find(({ cell }) => cell === worstCell);
  const ratio = worst && worst.right !== 0 ? worst.hand / worst.right : null;
  if (ratio !== null && ratio >= 10) return `up to ${shown(ratio)} times the right value${at}`;
  const side = ratio === null ? "off" : ratio < 0 ? "off, with the wrong sign" : ratio < 1 ? "too low" : "too high";
  return `up to ${shown(maxRelativeError * 100)} % ${side}${at}`;
}

/** Where rows err on the side that makes the installation look better than it is; empty where none does or it is not known. */
export function unsafeSideOf({ quantity, comparison }: Finding): string {
  const unsafe = quantity ? unsafeSides[quantity] : undefined;
  if (!unsafe || comparison.length === 0) return "";
  const off = comparison.filter(({ hand, right }) => Math.abs(hand - right) > 1e-3 * Math.abs(right));
  const bad = off.filter(({ hand, right }) => (unsafe.side === "low" ? hand < right : hand > right));
  if (bad.length === 0) return "";
  const rows =
    bad.length === off.length ? "in every row that is off" : `in ${bad.length} of ${off.length} rows that are off`;
  return `unsafe ${rows}: ${unsafe.why}`;
}

/** Three digits, thousands apart. */
export function shown(value: number): string {
  const rounded = Number(value.toPrecision(3));
  if (rounded !== 0 && (Math.abs(rounded) >= 1e6 || Math.abs(rounded) < 1e-3)) {
    const [digits, power] = rounded.toExponential().split("e") as [string, string];
    const raised = [...String(Number(power))].map((mark) => superscripts[mark]).join("");
    return digits === "1" ? `10${raised}` : `${digits}·10${raised}`;
  }
  return rounded.toLocaleString("en", { maximumSignificantDigits: 3 });
}

const superscripts: Record<string, string> = Object.fromEntries(
  [..."-0123456789"].map((mark, i) => [mark, [..."⁻⁰¹²³⁴⁵⁶⁷⁸⁹"][i]!]),
);
