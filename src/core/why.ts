import { peakFrequency, peakTransmissibility } from "./peak";
import { requiredFrequencyRatio } from "./required";
import { finite } from "./errors";
import {
  absoluteTransmissibility,
  type DampingModel,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "./transmissibility";

/** Where a mount works: the item goes along with the base, moves more than it, or less. */
export type Zone = "follows the base" | "amplifies" | "isolates";

/** T up to which an item below sqrt 2 fn counts as going along with its base. */
const FOLLOWS_UP_TO = 1.1;

/** Frequency ratios outside 1/40 to 40 are rarely meant: rpm for Hz is a factor 60, N/mm for N/m one of 31.6 in fn. */
const USUAL_RATIO = 40;

/** The zone at frequency ratio r with absolute and relative transmissibility T and R. */
export function zoneOf(r: number, T: number, R: number): Zone {
  if (r >= Math.SQRT2) return "isolates";
  return T <= FOLLOWS_UP_TO && R <= 1 ? "follows the base" : "amplifies"; // R near 2 beside sqrt 2: it moves against it
}

/**
 * One sentence on an operating point, fit for a report: zone, r, T, distance from sqrt 2 fn, peak, and the change that
 * would help most. Frequencies come back in the unit of the arguments, numbers with three significant digits.
 *
 * @param f, fn, zeta as in `absoluteTransmissibility`
 * @throws  outside-domain, pole as there
 */
export function why(f: number, fn: number, zeta: number, model: DampingModel): string {
  const transmissibility = model === "viscous" ? absoluteTransmissibility : hystereticTransmissibility;
  const T = transmissibility(f, fn, zeta);
  const relative = model === "viscous" ? relativeTransmissibility : hystereticRelativeTransmissibility;
  const r = finite("frequency ratio", f / fn);
  finite("onset of isolation", Math.SQRT2 * fn);
  const zone = zoneOf(r, T, relative(f, fn, zeta));
  const parts = [
    `${capital(zone)}: at r = ${digits(r)} the item moves ${digits(T)} times as much as its base${isolation(zone, T)}`,
    onset(r, fn),
    peak(fn, zeta, model),
    advice(zone, T, f, fn, zeta, model),
  ];
  if (r > USUAL_RATIO || (r < 1 / USUAL_RATIO && r > 0)) {
    parts.push(
      "this r is unusual, so check that both frequencies have one unit (rpm for Hz is a factor 60) and that the " +
        "natural frequency was not found with mm for m (a factor 31.6)",
    );
  }
  return `${parts.join("; ")}.`;
}

function isolation(zone: Zone, T: number): string {
  if (zone !== "isolates") return "";
  const percent = 100 * (1 - T);
  if (percent < 0.1) return " (less than 0.1 % isolation)";
  return percent > 99.9 ? " (more than 99.9 % isolation)" : ` (${digits(percent)} % isolation)`;
}

function onset(r: number, fn: number): string {
  const start = `√2·fn = ${digits(Math.SQRT2 * fn)}, where isolation begins`;
  const ratio = r / Math.SQRT2;
  if (Math.abs(ratio - 1) < 1e-12) return `that is ${start}`;
  return ratio > 1 ? `that is ${digits(ratio)} times ${start}` : `that is below ${start}`;
}

function peak(fn: number, zeta: number, model: DampingModel): string {
  if (zeta === 0) return "without damping nothing bounds the motion at resonance";
  const at = digits(peakFrequency(fn, zeta, model));
  return `the peak at resonance is ${digits(peakTransmissibility(zeta, model))} times, at ${at}`;
}

function advice(zone: Zone, T: number, f: number, fn: number, zeta: number, model: DampingModel): string {
  const transmissibility = model === "viscous" ? absoluteTransmissibility : hystereticTransmissibility;
  if (zone === "isolates") {
    const softer = transmissibility(f, 0.8 * fn, zeta);
    const lighter = transmissibility(f, fn, zeta / 2);
    if (lighter < softer) {
      return `half the damping would help most, to ${digits(lighter)} times, at the price of a higher peak`;
    }
    return `a natural frequency 20 % lower would help most, to ${digits(softer)} times`;
  }
  if (f === 0) return "a base at rest or in slow motion carries the item along whatever the mount";
  const half = f / requiredFrequencyRatio(0.5, zeta, model);
  const soft = `a natural frequency of ${digits(half)} or less would halve the base motion`;
  if (zone === "follows the base") return soft;
  const stiffer = f < fn && fn < 1e300 ? transmissibility(f, 1.5 * fn, zeta) : Infinity;
  const damped = transmissibility(f, fn, 2 * zeta);
  if (stiffer < T && stiffer < damped) {
    return `${soft}, or else a natural frequency 50 % higher would bring it to ${digits(stiffer)} times`;
  }
  return damped < T * 0.99 ? `${soft}, or else twice the damping would bring it to ${digits(damped)} times` : soft;
}

function capital(text: string): string {
  return text[0].toUpperCase() + text.slice(1);
}

/** Three significant digits without trailing zeros. */
function digits(value: number): string {
  return String(Number(value.toPrecision(3)));
}
