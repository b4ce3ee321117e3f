import type { Candidate } from "./meaning";
import type { Role } from "./roles";
import type { Unit } from "./units";

type Place = "base" | "item" | "stretch";
type Kind = "displacement" | "velocity" | "acceleration";

const places: Readonly<Record<Place, RegExp>> = {
  base: /\b(floor|ground|base|seating|soil|site|input|support|foundation|deck|corridor|slab|street|boden|fundament|fuss\w*|eingang\w*|untergrund|anregung\w*|sol|plancher|socle|entree|assise|x0|u|y|source|hull|track|road|chassis|frame|excitation|table in|in)\b/,
  item: /\b(bench|crate|box|product|cabinet|cabine|kabine|kabinen\w*|motor|moteur|engine|mirror|scanner|gyro|payload|item|machine|equipment|cab|camera|table|case|block|platform|output|response|instrument|top|mass|item|unit|rack|gerat\w*|nutzlast|tisch\w*|antwort\w*|ausgang\w*|maschine\w*|aufbau|plateau|charge|reponse|appareil|equipement|caisson|sortie|mounted|sensor|optic\w*|lid|box|tool|tray|microscope|seat|pod|out|x)\b/,
  stretch:
    /\b(rel\w*|stroke|travel|gap|stretch|clearance|z|spring|mount|isolator|federweg|relativ\w*|course|ecrasement|debattement|allongement|schwingweg|deflection|defl|rattle\w*|sway|einfederung|flexion)\b/,
};

const eitherPlace = /\b(table|platform|deck|frame|case|cab|block|rack|unit|tisch\w*|plateau|top|charge)\b/;

const kinds: Readonly<Record<Kind, RegExp>> = {
  displacement:
    /\b(disp\w*|motion|amplitude|ampl|travel|stroke|weg|auslenkung|ausschlag|deplacement|mvt|mouvement|course|deflection|defl|gap|x|excursion|schwingweg|bewegung|relativweg|ecrasement|debattement)\b/,
  velocity: /\b(vel\w*|v|geschw\w*|schwinggeschw\w*|schnelle|vitesse|vib\w* speed)\b/,
  acceleration: /\b(acc\w*|accel\w*|beschl\w*|a|g-level|g level|x¨)\b/,
};

const roleOf: Readonly<Record<Place, Record<Kind, Role>>> = {
  base: { displacement: "U", velocity: "Uv", acceleration: "Ua" },
  item: { displacement: "X", velocity: "Xv", acceleration: "Xa" },
  stretch: { displacement: "Z", velocity: "Zv", acceleration: "Za" },
};

const dimensionKind: Readonly<Record<string, Kind>> = {
  length: "displacement",
  velocity: "velocity",
  acceleration: "acceleration",
};

/** The motions that a label can mean: where it moves from the words, displacement or its rates from the unit, else the words. */
export function motionRoles(plain: string, context: string, unit: Unit | null): Candidate[] {
  const byUnit = unit ? dimensionKind[unit.dimension] : undefined;
  if (unit && !byUnit) return [];
  const byWord = (Object.keys(kinds) as Kind[]).find((kind) => kinds[kind].test(plain));
  const kind = byUnit ?? byWord;
  if (!kind) return [];
  const found: Candidate[] = [];
  for (const place of Object.keys(places) as Place[]) {
    const here = places[place].exec(plain);
    const around = !here && places[place].test(context);
    if (!here && !around) continue;
    let weight = here ? 5.5 : 3.5;
    if (byUnit && byWord) weight += 1;
    if (!byUnit) weight -= 1;
    if (place === "stretch" && /\brel\w*|\bgap\b|\bstroke\b|\bstretch\b/.test(plain)) weight += 2;
    if (here && here[0].length < 3) weight -= 1;
    found.push({ role: roleOf[place][kind], weight });
  }
  // what is called relative is the motion of neither
  if (/\brel\w*/.test(plain) && found.some(({ role }) => role === roleOf.stretch[kind]))
    found.forEach((one, i) => {
      if (one.role !== roleOf.stretch[kind]) found[i] = { ...one, weight: one.weight - 2 };
    });
  // a table or a deck may be what moves or what is moved
  const onItem = found.find(({ role }) => role === roleOf.item[kind]);
  if (onItem && !found.some(({ role }) => role === roleOf.base[kind]) && eitherPlace.test(plain))
    found.push({ role: roleOf.base[kind], weight: onItem.weight - 1.5 });
  if (found.length === 0 && (byUnit || byWord)) {
    const ofSomething = plain.split(/[^a-z]+/).filter((word) => word.length > 2 && !kinds[kind].test(word)).length > 0;
    for (const place of Object.keys(places) as Place[]) {
      // a relative motion is hardly ever left without a word for it
      const unlikely = place === "stretch" && ofSomething && (kind !== "displacement" || byWord !== undefined);
      found.push({ role: roleOf[place][kind], weight: (byUnit && byWord ? 2.5 : 1.5) - (unlikely ? 4 : 0) });
    }
  }
  return found;
}
