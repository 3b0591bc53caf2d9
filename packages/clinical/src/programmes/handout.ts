import type { Exercise, ExerciseForm } from "../exercises/exercise";
import { equipmentWords, placeWords, supportWords } from "../exercises/exercise";
import { findExercise, findForm } from "../exercises/library";
import type { Figure } from "../exercises/pose";
import { sessionTime } from "./compute-time";
import { sessionEquation } from "./equation";
import { defaultPainBands, type PainBands } from "./pain-bands";
import type { Programme, ProgrammeItem } from "./programme";

export interface HandoutEntry {
  /** The number of its first line in the programme. */
  readonly number: number;
  readonly title: string;
  readonly formName: string;
  readonly figure: Figure;
  readonly start: string;
  readonly steps: readonly string[];
  readonly how: string;
  readonly dose: string;
  readonly hold: string | null;
  readonly needs: string | null;
  readonly note: string;
  readonly cautions: readonly string[];
}

export interface Handout {
  readonly title: string;
  readonly summary: string;
  readonly entries: readonly HandoutEntry[];
  readonly advice: string;
  readonly careTitle: string;
  readonly care: string;
}

const numberWords = ["no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten"];
const inWords = (n: number) => numberWords[n] ?? String(n);
const plural = (n: number, one: string, many = `${one}s`) => (n === 1 ? one : many);
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** "20 minutes", "1 minute and 30 seconds", "45 seconds". */
export function durationWords(seconds: number): string {
  const minutes = Math.floor(seconds / 60);
  const rest = seconds % 60;
  const parts = [
    ...(minutes > 0 ? [`${minutes} ${plural(minutes, "minute")}`] : []),
    ...(rest > 0 || minutes === 0 ? [`${rest} ${plural(rest, "second")}`] : []),
  ];
  return parts.join(" and ");
}

const timesAWeek = (n: number) => {
  if (n === 7) return "every day";
  if (n > 7) return `${n} times a week`;
  return `on ${n} ${plural(n, "day")} a week`;
};

/** The session in two or three sentences, as the patient reads it first. */
export function sessionSummary(programme: Programme): string {
  const often = `Do this ${timesAWeek(programme.sessionsPerWeek)}.`;
  if (programme.items.length === 0) return often;
  if (programme.mode === "sets") {
    const count = programme.items.length;
    const minutes = Math.max(1, Math.round(sessionTime(programme).elapsedSeconds / 60));
    return `${capital(inWords(count))} ${plural(count, "exercise")}, about ${minutes} ${plural(minutes, "minute")} in all. ${often}`;
  }
  const { timedItems, rounds, workSeconds, restSeconds, totalSeconds } = sessionEquation(programme);
  const movements = `${capital(inWords(timedItems))} ${plural(timedItems, "movement")}`;
  const each =
    workSeconds !== null && restSeconds !== null
      ? `, ${workSeconds} seconds each with ${restSeconds} seconds of rest`
      : ", each with its own time";
  const round =
    rounds === 1 ? "Go through once" : rounds === 2 ? "Go round twice" : `Go round ${inWords(rounds)} times`;
  return `${movements}${each}. ${round}: ${durationWords(totalSeconds)}. ${often}`;
}

const sideTitle = {
  both: "",
  left: ", left side",
  right: ", right side",
  each: ", left then right",
} as const;

function doseWords(programme: Programme, item: ProgrammeItem): string {
  if (programme.mode === "timed") {
    const rest = item.restSeconds === 0 ? "no rest" : `then rest ${durationWords(item.restSeconds)}`;
    return `${capital(durationWords(item.workSeconds))}, ${rest}.`;
  }
  const hold = item.holdSeconds > 0 ? `, holding each for ${durationWords(item.holdSeconds)}` : "";
  const slow = `, about ${item.repetitionSeconds} seconds each`;
  const rest =
    item.sets > 1 && item.restBetweenSetsSeconds > 0
      ? ` Rest ${durationWords(item.restBetweenSetsSeconds)} between sets.`
      : "";
  const side = item.side === "each" ? " on each side" : "";
  return `${item.sets} ${plural(item.sets, "set")} of ${item.repetitions}${side}${hold || slow}.${rest}`;
}

function needsWords(exercise: Exercise, form: ExerciseForm): string | null {
  const place = exercise.place === null ? [] : [placeWords[exercise.place]];
  const words = [...form.needs.map((need) => equipmentWords[need]), ...place];
  return words.length === 0 ? null : words.join(", ");
}

/** Left and right of the same line, one after the other, are one entry of the handout. */
function isOtherSide(item: ProgrammeItem, next: ProgrammeItem | undefined): boolean {
  return (
    next !== undefined &&
    item.side === "left" &&
    next.side === "right" &&
    (["exercise", "form", "support", "note", "workSeconds", "restSeconds"] as const).every(
      (k) => item[k] === next[k],
    )
  );
}

function entry(
  programme: Programme,
  item: ProgrammeItem,
  index: number,
  bothSides: boolean,
): HandoutEntry | null {
  const exercise = findExercise(item.exercise);
  const form = findForm(item.exercise, item.form);
  if (!exercise || !form) return null;
  return {
    number: index + 1,
    title: `${exercise.name}${bothSides ? sideTitle.each : sideTitle[item.side]}`,
    formName: form.name,
    figure: form.figure ?? exercise.figure,
    start: exercise.start,
    steps: exercise.steps,
    how: form.how,
    dose: doseWords(programme, item),
    hold: item.support === null ? null : `${capital(supportWords[item.support])}.`,
    needs: needsWords(exercise, form),
    note: item.note,
    cautions: exercise.cautions,
  };
}

function entries(programme: Programme): HandoutEntry[] {
  const made: HandoutEntry[] = [];
  for (let index = 0; index < programme.items.length; index += 1) {
    const item = programme.items[index];
    if (!item) continue;
    const bothSides = isOtherSide(item, programme.items[index + 1]);
    const one = entry(programme, item, index, bothSides);
    if (one) made.push(one);
    if (bothSides) index += 1;
  }
  return made;
}

/** What pain means, by the practice's bands, and when to stop. */
export function careWords(bands: PainBands = defaultPainBands): string {
  return (
    `If pain goes over ${bands.acceptableTo} out of 10, or is worse the next morning, do the easier form. ` +
    "If your calf swells, your chest hurts, or you suddenly cannot put weight on the leg, stop. " +
    "Ring us or 111, or 999 if you feel very unwell."
  );
}

/** Everything that the patient holds in the hand, in plain words; the same for paper and screen. */
export function handout(programme: Programme, calledName: string): Handout {
  return {
    title: `Your exercises, ${calledName}`,
    summary: sessionSummary(programme),
    entries: entries(programme),
    advice: programme.advice,
    careTitle: "Some ache is fine.",
    care: careWords(),
  };
}
