import type { Node } from "../formula/nodes";
import { cellName } from "../formula/references";
import { aggregateFinding } from "./aggregates";
import { bandRms } from "./band-rms";
import type { Book, Form } from "./book";
import { ranges } from "./audit";
import { exactConstant } from "./constants";
import { contradicted } from "./contradiction";
import { combinedStiffness } from "./combined";
import { blockHasDamping, blockInputs, isCircular, neighbours, saysUndamped } from "./context";
import { type Cut, cutFormula, evaluateCut, type Leaf, leafColumn, leafRow } from "./cut";
import { type Effect, effectOf } from "./effect";
import {
  anyTarget,
  explainFault,
  type Explanation,
  explainSound,
  type Question,
  type Target,
  targetsOf,
} from "./explain";
import type { Finding } from "./finding";
import { factorsOf, type Interpretation, interpretationsOf, isMotion } from "./interpret";
import { levelFinding } from "./levels";
import { type Meaning, meaningOf } from "./meaning";
import { mistakes, type Mistake, type Quantity, quantities } from "./quantities";
import { ownFunctionFinding } from "./own-functions";
import { quantityMeant, quantityOf } from "./naming";
import { slippedReference } from "./reference-slips";
import { repaired } from "./repairs";
import { type Role, roles } from "./roles";
import { slippedRow } from "./row-slips";
import type { Run } from "./runs";
import { cellOf, sharesTaken, takenAlone } from "./shares";
import { sampleCut } from "./samples";
import { sigmasIn, statedBy, statedIn } from "./stated";
import { gravity } from "./units";
import { plainText } from "./words";
import { cellKey, columnOf, rowOf } from "./workbook";

/** The result for one run. */
export interface Analysis {
  readonly run: Run;
  readonly meaning: Meaning;
  readonly verdict: "agrees" | "differs" | "unrecognised";
  readonly quantity: Quantity | null;
  readonly mistake: Mistake | null;
  readonly why: string;
  readonly explanation: Explanation | null;
  /** a wrong helper that feeds this formula */
  readonly fedBy: string | null;
  /** the first cell is right, the others are not */
  readonly firstAgrees?: boolean;
}

export interface Analyser {
  analysis(run: Run): Analysis;
  findings(run: Run): Finding[];
  meaningAt(sheet: number, row: number, column: number): Meaning;
  /** explains one formula cell by itself, as if it were a run of its own */
  alone(run: Run): Analysis;
}

const terms = new Set<Role>([
  "rr",
  "detuning",
  "detuning2",
  "b",
  "bb",
  "numerator",
  "denominator",
  "rootNumerator",
  "rootDenominator",
  "quasi",
]);
/** Words of what is no quantity of ours, however its formula looks. */
const otherMatters =
  /\b(margin|reserve|marge|utili[sz]ation|auslastung|ausnutzung|cost|kosten|cout|price|preis|prix|eur|usd|summe|budget|hours|stunden|heures|kw|kwh)\b/;
const gravities = [gravity, gravity * 1000, gravity * 100, gravity / 0.0254, gravity / 0.3048];
/** Mistakes that a unit alone can tell. */
const unitMistakes = new Set<Mistake | null>(["angular-cyclic-mixup", "speed-unit", "length-unit", "amplitude-kind"]);
const requiredWords =
  /\b(req\w*|need\w*|erf\w*|requis\w*|necessaire|nec|wanted|min|max|maxim\w*|highest|greatest|hochste\w*|allow\w*|target|soll|zul\w*|design|for target|notig\w*)\b|\b(for|fur|pour) (an? |\w{1,2} ?= ?)?\d+([.,]\d+)? ?hz\b/;

/** Analyses the runs of a book, precedents first, each once. */
export function analyser(book: Book, runs: readonly Run[]): Analyser {
  const runAt = new Map<string, Run>();
  for (const run of runs) for (const cell of run.cells) runAt.set(`${run.sheet}:${cell}`, run);
  const byForm = new Map<Form, Run[]>();
  for (const run of runs) {
    const same = byForm.get(run.form);
    if (same) same.push(run);
    else byForm.set(run.form, [run]);
  }
  const meanings = new Map<string, Meaning>();
  const done = new Map<Run, Analysis>();
  const busy = new Set<Run>();

  function meaningAt(sheet: number, row: number, column: number): Meaning {
    const key = `${sheet}:${cellKey(row, column)}`;
    let found = meanings.get(key);
    if (!found)
      meanings.set(
        key,
        (found =
          sheet < 0
            ? { candidates: [], unit: null, kind: null, text: "", label: "" }
            : meaningOf(book, sheet, row, column)),
      );
    return found;
  }

  function analysisAt(sheet: number, row: number, column: number): Analysis | null {
    const run = runAt.get(`${sheet}:${cellKey(row, column)}`);
    return run && !busy.has(run) && busy.size < 150 ? analysis(run) : null;
  }

  function analysis(run: Run): Analysis {
    const known = done.get(run);
    if (known) return known;
    busy.add(run);
    const result = analyseRun(run);
    busy.delete(run);
    done.set(run, result);
    return result;
  }

  let votes: ReturnType<typeof sharesTaken> | null = null;
  let forced: ReadonlyMap<string, Role> = new Map();

  /** The analysis after a look at how the book's other formulas take the same inputs. */
  function finalAnalysis(run: Run): Analysis {
    const first = analysis(run);
    if (first.verdict !== "agrees" || !first.explanation) return first;
    votes ??= sharesTaken(runs.map(analysis));
    const shares = takenAlone(first, votes);
    if (shares.size === 0) return first;
    forced = shares;
    const second = analyseRun(run);
    forced = new Map();
    if (second.verdict !== "differs" || second.mistake !== "mount-count-missing") return first;
    done.set(run, second);
    return second;
  }

  /** What a leaf can be: from its labels, and from what its own formula was found to compute. */
  function readingsOf(leaf: Leaf, withKinds: boolean): Interpretation[] {
    const { sheet, row, column } = labelPlace(book, leaf);
    const meaning = meaningAt(sheet, row, column);
    const one = forced.get(cellOf(leaf));
    const found = interpretationsOf(meaning, withKinds ? meaning.kind : null, 4).filter(
      ({ role }) => one === undefined || role === one,
    );
    const computed = leaf.lookup || one !== undefined ? null : analysisAt(leaf.sheet, leaf.row, leaf.column);
    if (computed?.verdict === "agrees" && computed.explanation) {
      const { role, factor } = computed.explanation.target;
      const same = found.findIndex((reading) => reading.role === role && Math.abs(reading.factor / factor - 1) < 1e-9);
      const cost = found.length === 0 || same === 0 ? 0 : 0.3;
      const reading = { role, factor, cost, unitKnown: true };
      // what a ratio or a level was found to be, it is
      const certain = ["T", "R", "E", "LT", "r", "zeta", "Tpk"].includes(role) && same >= 0;
      if (certain) return [reading];
      if (same >= 0) found[same] = reading;
      else found.push(reading);
      found.sort((a, b) => a.cost - b.cost);
    }
    return found;
  }

  function isOpaque(sheet: number, row: number, column: number): boolean {
    const computed = analysisAt(sheet, row, column);
    if (computed?.explanation && terms.has(computed.explanation.target.role)) return true;
    const best = meaningAt(sheet, row, column).candidates[0];
    if (best && best.weight >= 3 && !terms.has(best.role)) return false;
    return !computed || computed.verdict !== "agrees" || !computed.explanation;
  }

  /** A typed number that its label calls gravity is a constant, as if it were typed into the formula. */
  function constantAt(sheet: number, row: number, column: number): number | null {
    const value = book.value(sheet, row, column);
    if (typeof value !== "number" || book.sheets[sheet]?.forms.has(cellKey(row, column))) return null;
    const exact = exactConstant(String(value), value);
    const isGravity = gravities.some((known) => Math.abs(exact / known - 1) < 3e-3);
    return isGravity && meaningAt(sheet, row, column).candidates[0]?.role === "g" ? exact : null;
  }

  function* cutsOf(run: Run): Generator<Cut> {
    const key = run.anchor;
    const seen = new Set<string>();
    const levels: ((sheet: number, row: number, column: number, depth: number) => boolean)[] = [
      () => false,
      (sheet, row, column) => isOpaque(sheet, row, column),
      (_sheet, _row, _column, depth) => depth < 1,
      (sheet, row, column, depth) => depth < 1 || isOpaque(sheet, row, column),
      (_sheet, _row, _column, depth) => depth < 2,
      (_sheet, _row, _column, depth) => depth < 6,
    ];
    for (const opens of levels) {
      const cut = cutFormula(book, run.sheet, rowOf(key), columnOf(key), run.form, opens, constantAt);
      if (!cut) continue;
      const signature = cut.leaves.map(({ sheet, row, column }) => `${sheet}:${row}:${column}`).join(" ");
      if (seen.has(signature)) continue;
      seen.add(signature);
      yield cut;
    }
  }

  /**
   * A formula that has no value with the percentages of the sheet, but agrees when they are fractions, takes a percentage
   * for a fraction.
   */
  function percentAsRatio(run: Run, cut: Cut, meaning: Meaning): Explanation | null {
    const scales = cut.leaves.map((leaf) => {
      const { sheet, row, column } = labelPlace(book, leaf);
      const { unit } = meaningAt(sheet, row, column);
      return unit?.dimension === "number" && unit.factor === 0.01 ? 0.01 : 1;
    });
    if (!scales.includes(0.01) || questionOf(run, cut, meaning) !== null) return null;
    const question = questionOf(run, cut, meaning, scales);
    return question && explainSound(question);
  }

  function questionOf(run: Run, cut: Cut, meaning: Meaning, scales?: readonly number[]): Question | null {
    const stated = statedIn(meaning.text);
    if (cut.hasRange || (cut.leaves.length === 0 && stated.length === 0)) return null;
    const first = run.anchor;
    const places = run.cells.map((cell) => ({
      down: rowOf(cell) - rowOf(first),
      across: columnOf(cell) - columnOf(first),
    }));
    // a transmissibility is a size, whatever sign the sheet has given it
    const sizes = cut.leaves.map(
      (leaf) => !leaf.lookup && meaningAt(leaf.sheet, leaf.row, leaf.column).candidates[0]?.role === "T",
    );
    const samples = sampleCut(book, cut, places, scales, sizes);
    if (samples.usable.filter(Boolean).length < 2 || (samples.mask === 0 && stated.length === 0)) return null;
    const kinds = kindsKnown(cut, meaning);
    const readings = cut.leaves.map((leaf, i) =>
      readingsOf(leaf, kinds).map((reading) =>
        scales ? { ...reading, factor: reading.factor / scales[i]! } : reading,
      ),
    );
    return {
      cut,
      samples,
      evaluate: (inputs) => evaluateCut(cut, inputs).value,
      readings,
      targets: targetsOf(meaning, kinds, mountsCounted(run)),
      stated,
      mountsCounted: mountsCounted(run),
      coarse: saysUndamped(book, run, meaning),
    };
  }

  /** Peak, rms and peak-to-peak can be compared only where every oscillating number states its kind. */
  function kindsKnown(cut: Cut, meaning: Meaning): boolean {
    const involved = [
      meaning,
      ...cut.leaves.map((leaf) => {
        const p = labelPlace(book, leaf);
        return meaningAt(p.sheet, p.row, p.column);
      }),
    ].filter(({ candidates }) => candidates[0] !== undefined && isMotion(candidates[0].role));
    const tops = [meaning, ...cut.leaves.map((leaf) => meaningAt(leaf.sheet, leaf.row, leaf.column))];
    const isRandom = ({ candidates, text, kind }: Meaning): boolean =>
      (candidates[0]?.role === "zrms" && (kind === null || kind === "rms")) ||
      (candidates[0]?.role === "grms" && /miles|random|grms|sigma|[pa]sd/.test(text));
    if (tops.some(isRandom)) return false;
    return involved.length > 0 && involved.every(({ kind }) => kind !== null);
  }

  const counted = new Map<Run, boolean>();
  function mountsCounted(run: Run): boolean {
    let found = counted.get(run);
    if (found === undefined) {
      found = [...blockInputs(book, run), ...neighbours(book, run)].some(([sheet, row, column]) => {
        const best = meaningAt(sheet, row, column).candidates[0];
        const value = book.value(sheet, row, column);
        return best?.role === "n" && best.weight >= 4 && typeof value === "number" && value > 1;
      });
      counted.set(run, found);
    }
    return found;
  }

  function analyseRun(run: Run): Analysis {
    const key = run.anchor;
    const meaning = meaningAt(run.sheet, rowOf(key), columnOf(key));
    const nothing: Analysis = {
      run,
      meaning,
      verdict: "unrecognised",
      quantity: null,
      mistake: null,
      why: "",
      explanation: null,
      fedBy: null,
    };
    if (!run.form.readable || isLookup(run.form.tree) || isCircular(book, run)) return nothing;
    const called = ownFunctionFinding(book, run, meaning, meaningAt);
    if (called) return { ...nothing, ...called };
    const questions: { question: Question; level: number; fedBy: string | null }[] = [];
    let level = 0;
    let best = null as { found: Explanation; cost: number; fedBy: string | null } | null;
    for (const cut of cutsOf(run)) {
      const question = questionOf(run, cut, meaning);
      if (question) {
        questions.push({ question, level, fedBy: null });
        if (question.samples.complex) {
          const term = explainSound({ ...question, targets: ofComplex });
          if (term) return { ...nothing, verdict: "agrees", quantity: "helper", explanation: term };
        }
        const found = explainSound(question);
        const cost = found ? found.cost + level * 0.4 : 0;
        if (found && (!best || cost < best.cost)) best = { found, cost, fedBy: null };
        if (best && best.cost < 1.2) break;
      }
      level++;
    }
    if (questions.length === 0) {
      for (const cut of cutsOf(run)) {
        const found = percentAsRatio(run, cut, meaning);
        if (found)
          return {
            ...sound(run, meaning, found),
            verdict: "differs",
            mistake: "percent-as-ratio",
            why: "With a percentage the formula has no value at all.",
          };
      }
    }
    const ofOverall =
      questions[0] &&
      questions[0].question.cut.leaves.length > 0 &&
      questions[0].question.cut.leaves.every(
        (leaf) => analysisAt(leaf.sheet, leaf.row, leaf.column)?.quantity === "overall-rms",
      );
    if (ofOverall) return { ...nothing, quantity: "overall-rms", ...convertedRms(questions[0]!.question, meaning) };
    for (const { question } of best ? [] : questions) {
      const ofLevel =
        levelFinding(question, meaning) ?? combinedStiffness(question, meaning) ?? bandRms(question, meaning);
      if (ofLevel) return { ...nothing, ...ofLevel };
    }
    if (!best && meaning.candidates.length > 0) {
      for (const { question } of questions) {
        const stated = [...question.stated, ...statedBy(question.cut)];
        if (stated.length === question.stated.length) continue;
        const found = explainSound({ ...question, stated });
        if (found && (!best || found.cost < best.cost)) best = { found, cost: found.cost, fedBy: null };
      }
    }
    if (!best) {
      for (const { question } of questions.slice(0, 3)) {
        const slipped = slippedReference(question, run);
        if (slipped)
          return {
            ...sound(run, meaning, slipped.explanation),
            verdict: "differs",
            mistake: "reference-slip",
            why: slipped.why,
          };
      }
    }
    if (!best) {
      const slipped = slippedFill(run);
      if (slipped) return { ...slipped, run };
    }
    if (!best && questions[0]) {
      const slipped = slippedSibling(run, questions[0].question);
      if (slipped) return { ...nothing, ...slipped };
    }
    const labelled = (meaning.candidates[0]?.weight ?? 0) >= (meaning.unit ? 2.5 : 4);
    if (best) return sound(run, meaning, best.found);
    if (meaning.candidates.length > 0 && !otherMatters.test(plainText(meaning.label))) {
      let worst = null as { found: Explanation; cost: number } | null;
      for (const { question, level: depth } of questions.slice(0, 4)) {
        const found = explainFault(question);
        const cost = found ? found.cost + depth * 0.6 : 0;
        if (found && (!worst || cost < worst.cost)) worst = { found, cost };
      }
      const byUnit =
        meaning.unit !== null &&
        meaning.unit.dimension !== "number" &&
        worst !== null &&
        unitMistakes.has(worst.found.fault!.mistake);
      if (worst && (labelled || byUnit)) return faulty(run, meaning, worst.found);
      if (labelled) {
        for (const { question } of questions.slice(0, 3)) {
          const found = repaired(question);
          if (found) return faulty(run, meaning, found);
        }
      }
    }
    const contradiction =
      best === null
        ? contradicted(
            questions.map(({ question }) => question),
            meaning,
          )
        : null;
    if (contradiction) return { ...nothing, ...contradiction };
    const aggregate = aggregateFinding(book, run, meaning, meaningAt);
    if (aggregate) return { ...nothing, ...aggregate };
    const named = meaning.candidates.length > 0;
    for (const { question } of named ? [] : questions.slice(0, 2)) {
      const found = unlabelled(question);
      if (found) return sound(run, meaning, found);
    }
    for (const { question } of otherMatters.test(meaning.text) ? [] : questions) {
      const found = explainSound({ ...question, targets: anyTarget(meaning) });
      if (found && found.cost < 8) return sound(run, meaning, found);
    }
    return nothing;
  }

  const ofUnlabelled: Interpretation[] = (["r", "zeta", "eta", "f", "fn"] as const).map((role) => ({
    role,
    factor: 1,
    cost: 2,
    unitKnown: false,
  }));
  const responses: Target[] = (["T", "R", "LT", "phiA", "phiR"] as const).flatMap((role) =>
    factorsOf(role, null).factors.map((factor) => ({ role, factor, cost: 1 })),
  );

  /** A complex column is an intermediate term, whatever its size agrees with. */
  const ofComplex: Target[] = (["T", "R", "rootNumerator", "rootDenominator", "quasi", "b"] as const).map((role) => ({
    role,
    factor: 1,
    cost: 1,
  }));

  function sound(run: Run, meaning: Meaning, explanation: Explanation): Analysis {
    const asked = requiredWords.test(meaning.text) || fedByRequirement(explanation);
    const computed = quantityOf(explanation.entry, asked);
    // a multiple of a standard deviation is a random response, whatever it was converted from
    const random = sigmasIn(meaning) !== null && computed === "motion-conversion";
    const quantity = random ? "random-response-rms" : computed;
    const result: Analysis = {
      run,
      meaning,
      verdict: "agrees",
      quantity,
      mistake: null,
      why: "",
      explanation,
      fedBy: null,
    };
    const sensitive = ["T", "R", "E", "LT"].includes(explanation.target.role) && explanation.entry.undamped;
    if (sensitive && !saysUndamped(book, run, meaning) && blockHasDamping(book, run, meaningAt)) {
      return {
        ...result,
        verdict: "differs",
        mistake: "undamped-form",
        why: "The block has a damping that this formula leaves out.",
      };
    }
    const slipped = slippedRow(book, run, explanation);
    if (slipped) return { ...result, verdict: "differs", mistake: "reference-slip", why: slipped };
    const meant = meaning.candidates[0];
    const onlySpring = explanation.target.role === "Fs" && meant?.role === "F" && meant.weight >= 5;
    if (onlySpring && blockHasDamping(book, run, meaningAt)) {
      return {
        ...result,
        verdict: "differs",
        mistake: "undamped-form",
        why: "The damper's part of the force is left out.",
      };
    }
    if (usesStaticStiffness(run, meaning, explanation)) {
      const why = "The mount is stiffer in motion: the frequency needs the dynamic stiffness that the sheet has.";
      return { ...result, verdict: "differs", mistake: "static-stiffness-for-dynamic", why };
    }
    return result;
  }

  /**
   * A column whose first formula is right, but which was filled without a $: its other rows read a parameter's neighbours,
   * or results of the column itself.
   */
  function slippedFill(run: Run): Analysis | null {
    if (run.direction === "single" || run.cells.length < 3 || run.anchor === run.cells[0]) return null;
    const [first, second] = run.cells as [number, number];
    const alone = analyseRun({ ...run, cells: [first], anchor: first, direction: "single" });
    if (alone.verdict !== "agrees" || !alone.explanation || alone.explanation.cost > 2) return null;
    const { cut, readings } = alone.explanation;
    const down = rowOf(second) - rowOf(first);
    const across = columnOf(second) - columnOf(first);
    for (const [i, leaf] of cut.leaves.entries()) {
      const row = leafRow(leaf, down);
      const column = leafColumn(leaf, across);
      if (leaf.lookup || (row === leaf.row && column === leaf.column)) continue;
      const ownResult = leaf.sheet === run.sheet && run.cells.includes(cellKey(row, column));
      const best = meaningAt(leaf.sheet, row, column).candidates[0];
      const another =
        best !== undefined &&
        best.weight >= 5 &&
        readings[i] !== undefined &&
        roles[best.role].dimension !== roles[readings[i].role].dimension;
      const blank = book.value(leaf.sheet, row, column) === null;
      if (!ownResult && !another && !blank) continue;
      const name = cellName(leaf.row, leaf.column);
      const why = `The reference ${name} is right in the first cell and moves on with the fill: a $ is missing.`;
      return { ...alone, verdict: "differs", mistake: "reference-slip", why, firstAgrees: true };
    }
    return null;
  }

  /** One column of a chart that reads another column of results: the same formula is right where it reads the axis. */
  function slippedSibling(
    run: Run,
    { cut }: Question,
  ): Pick<Analysis, "verdict" | "quantity" | "mistake" | "why"> | null {
    const siblings = (byForm.get(run.form) ?? []).filter((other) => other !== run && other.sheet === run.sheet);
    if (siblings.length === 0) return null;
    const leaf = cut.leaves.find(({ sheet, row, column }) => {
      const other = runAt.get(`${sheet}:${cellKey(row, column)}`);
      return other !== undefined && siblings.includes(other);
    });
    const right = leaf && siblings.find((other) => !busy.has(other) && analysis(other).verdict === "agrees");
    if (!right) return null;
    const why = `The reference ${cellName(leaf.row, leaf.column)} reads a result of the neighbouring column: a $ is missing.`;
    return { verdict: "differs", quantity: analysis(right).quantity, mistake: "reference-slip", why };
  }

  /** A response of unlabelled inputs whose form leaves no doubt. */
  function unlabelled(question: Question): Explanation | null {
    const { readings, cut, samples } = question;
    const bare = readings.flatMap((list, i) => (samples.mask & (1 << i) && list.length === 0 ? [i] : []));
    if (bare.length === 1 || bare.length > 2 || cut.leaves.length > 3) return null;
    const found = explainSound({
      ...question,
      readings: readings.map((list, i) => (bare.includes(i) ? ofUnlabelled : list)),
      targets: responses,
    });
    return found && found.entry.relation && (bare.length > 0 || found.target.role === "LT") ? found : null;
  }

  /** A natural frequency from a stiffness that its label calls static, or from the deflection, beside a dynamic one. */
  function usesStaticStiffness(run: Run, meaning: Meaning, { target, cut, readings, entry }: Explanation): boolean {
    const own = meaning.words ?? meaning.text;
    const ofStiffness = target.role === "k" || target.role === "kEach";
    if (ofStiffness && !(/\bdyn/.test(own) && !/\bstat/.test(own))) return false;
    if ((target.role !== "fn" && !ofStiffness) || /\b(approx\w*|rough\w*|quick|uberschlag\w*|approch\w*)/.test(own))
      return false;
    if (entry.relation?.required || /\bstat/.test(own)) return false;
    const used = cut.leaves.map((leaf, i) => {
      const { sheet, row, column } = labelPlace(book, leaf);
      const { text, words = text } = meaningAt(sheet, row, column);
      return { role: readings[i]?.role, text: words };
    });
    if (used.some(({ role, text }) => role === "kappa" || /\bk?\W?dyn/.test(text))) return false;
    const isStatic = used.some(({ role, text }) => (role === "k" || role === "kEach") && /\bk?\W?stat/.test(text));
    const byDeflection = used.some(({ role }) => role === "delta");
    if (!isStatic && !byDeflection) return false;
    return [...blockInputs(book, run), ...neighbours(book, run)].some(([sheet, row, column]) => {
      const { candidates, text } = meaningAt(sheet, row, column);
      const best = candidates[0];
      const value = book.value(sheet, row, column);
      if (!best || best.weight < 5 || typeof value !== "number") return false;
      if (best.role === "kappa") return value !== 1;
      return (isStatic || /\bdyn/.test(own)) && (best.role === "k" || best.role === "kEach") && /\bk?\W?dyn/.test(text);
    });
  }

  /** A deflection or frequency among the inputs is itself a requirement. */
  function fedByRequirement({ cut, readings }: Explanation): boolean {
    return cut.leaves.some((leaf, i) => {
      const role = readings[i]?.role;
      if (leaf.lookup || (role !== "delta" && role !== "fn" && role !== "k" && role !== "r")) return false;
      const quantity = role === "k" ? null : analysisAt(leaf.sheet, leaf.row, leaf.column)?.quantity;
      return (
        quantity?.startsWith("required-") === true ||
        /\breq|\berf|\brequis/.test(meaningAt(leaf.sheet, leaf.row, leaf.column).text)
      );
    });
  }

  function faulty(run: Run, meaning: Meaning, explanation: Explanation): Analysis {
    const { fault, entry, target } = explanation;
    const isStiffness = roles[target.role].dimension === "stiffness" && roles[entry.role].dimension === "stiffness";
    const quantity =
      entry.role === target.role || isStiffness
        ? quantityOf(entry, requiredWords.test(meaning.text) || fedByRequirement(explanation))
        : (quantityMeant(target.role) ?? "helper");
    return {
      run,
      meaning,
      verdict: "differs",
      quantity,
      mistake: fault!.mistake,
      why: fault!.why,
      explanation,
      fedBy: null,
    };
  }

  function findings(run: Run): Finding[] {
    const found = finalAnalysis(run);
    const effect = found.explanation && found.verdict === "differs" ? effectOf(book, run, found) : null;
    if (found.firstAgrees) {
      const agrees: Analysis = { ...found, verdict: "agrees", mistake: null, why: "", firstAgrees: false };
      return [
        ...describe({ ...run, cells: run.cells.slice(0, 1) }, agrees, null),
        ...describe({ ...run, cells: run.cells.slice(1) }, found, null),
      ];
    }
    return describe(run, found, effect);
  }

  function describe(run: Run, found: Analysis, effect: Effect | null): Finding[] {
    return ranges(run.cells).map(({ text, cells }) => ({
      sheet: book.sheets[run.sheet]!.name,
      cell: text,
      quantity: found.verdict === "unrecognised" ? null : found.quantity,
      verdict: found.verdict,
      mistake: found.mistake,
      relation: found.explanation?.entry.relation?.id ?? null,
      evidence: found.explanation ? evidenceOf(found) : "",
      maxRelativeError: found.verdict === "agrees" ? 0 : (effect?.largest ?? null),
      worstCell: effect?.worst ?? null,
      suggestion: suggestionOf(found),
      message: messageOf(found),
      formula: book.sheets[run.sheet]!.sheet.cells.get(cells[0]!)!.formula ?? "",
      comparison: effect?.comparison ?? [],
      role: found.explanation?.target.role ?? null,
    }));
  }

  return { analysis, findings, meaningAt, alone: analyseRun };
}

const isLookup = (tree: Node): boolean =>
  tree.kind === "call" && /^([VHX]?LOOKUP|INDEX|MATCH|CHOOSE|DATE|TODAY|NOW)$/.test(tree.name);

/** The cell whose labels speak for a leaf: itself, or the column that a look-up returns. */
function labelPlace(book: Book, leaf: Leaf): { sheet: number; row: number; column: number } {
  const { lookup } = leaf;
  if (!lookup || lookup.tree.kind !== "call") return leaf;
  const [first, second, third] = lookup.tree.arguments;
  const ofTable = lookup.tree.name === "VLOOKUP" || lookup.tree.name === "HLOOKUP";
  const range =
    ofTable || lookup.tree.name === "LOOKUP" || lookup.tree.name === "XLOOKUP" ? (ofTable ? second : third) : first;
  if (range?.kind !== "reference" || range.from.row === null || range.from.column === null) return leaf;
  const sheet = range.sheet === null ? leaf.sheet : book.sheetNumber(range.sheet);
  const nth = ofTable && third?.kind === "number" ? third.value - 1 : 0;
  return lookup.tree.name === "HLOOKUP"
    ? { sheet, row: range.from.row + nth, column: range.from.column }
    : { sheet, row: range.from.row, column: range.from.column + nth };
}

function evidenceOf({ explanation }: Analysis): string {
  const { entry, target, readings, cut } = explanation!;
  const inputs = cut.leaves
    .map(
      (leaf, i) =>
        `${cellName(leafRow(leaf, 0), leafColumn(leaf, 0))} = ${readings[i] ? roles[readings[i].role].says : "?"}`,
    )
    .join(", ");
  const agreement = explanation!.fault ? "agrees with the slip at 6 of 6 points" : "agrees at 6 of 6 points";
  return `${roles[target.role].says} by ${entry.relation?.formula ?? "conversion"}; ${inputs}; ${agreement}`;
}

function suggestionOf({ explanation }: Analysis): string | null {
  const name = explanation?.entry.relation?.cellFunction;
  if (!name) return null;
  return `PLINTH.${name}(${(explanation.entry.relation!.arguments ?? []).map((role) => roles[role].says).join(", ")})`;
}

function messageOf(found: Analysis): string {
  if (found.verdict === "unrecognised" || !found.quantity) return "not recognised";
  const says = quantities[found.quantity];
  if (found.verdict === "agrees") return `${says}: agrees.`;
  const mistake = found.mistake ? mistakes[found.mistake] : "departs from the published relation";
  return `${says}: ${mistake}. ${found.why}`;
}

/** A converted overall value: its unit may be another, g must not be doubled. */
function convertedRms(
  { samples, cut, readings }: Question,
  meaning: Meaning,
): Pick<Analysis, "verdict" | "mistake" | "why"> {
  const agrees = { verdict: "agrees", mistake: null, why: "" } as const;
  const input = readings[0]?.find(({ role }) => roles[role].dimension === "acceleration");
  if (cut.leaves.length !== 1 || !input?.unitKnown || meaning.unit?.dimension !== "acceleration") return agrees;
  const ratio = (samples.hand[0]! * meaning.unit.factor) / (samples.inputs[0]![0]! * input.factor);
  const kinds = [1, Math.SQRT2, Math.SQRT1_2];
  const doubled = [gravity, gravity ** 2, 1 / gravity, 1 / gravity ** 2].some((g) =>
    kinds.some((kind) => Math.abs((ratio * kind) / g - 1) < 2e-3),
  );
  return doubled
    ? { verdict: "differs", mistake: "mass-weight-mixup", why: "The step between m/s² and g is taken the wrong way." }
    : agrees;
}
