import type { LetterSentence, LetterSource } from "@withy/contracts/letters";
import { plainDateWords, shortDate } from "@withy/core/date-words";
import type { DischargeFacts, NotedText, ProgrammeFact } from "./discharge-facts";
import { assembled, capital, listWords, noted, numberWord } from "./wording";

export function attendance(facts: DischargeFacts): LetterSentence[] {
  const { attended, missed, firstOn, lastOn } = facts.visits;
  const source: LetterSource = { kind: "visits", id: facts.episode.id, label: "Visits" };
  const visits = `${capital(numberWord(attended))} ${attended === 1 ? "visit was" : "visits were"} attended`;
  const span =
    firstOn === null || lastOn === null
      ? ""
      : firstOn === lastOn
        ? `, on ${plainDateWords(firstOn)}`
        : `, from ${plainDateWords(firstOn)} to ${plainDateWords(lastOn)}`;
  const sentences = [assembled("attendance", "attended", `${visits}${span}`, source)];
  if (missed > 0) {
    const text = `${capital(numberWord(missed))} ${missed === 1 ? "visit was" : "visits were"} missed without notice`;
    sentences.push(assembled("attendance", "missed", text, source));
  }
  return sentences;
}

/** The same words in two notes are said once, with the first note as their source. */
function withoutRepeats(notes: readonly NotedText[]): NotedText[] {
  const seen = new Set<string>();
  return notes.filter(({ text }) => {
    const plain = text.trim().toLowerCase();
    if (plain === "" || seen.has(plain)) return false;
    seen.add(plain);
    return true;
  });
}

export function summary(facts: DischargeFacts): LetterSentence[] {
  return withoutRepeats(facts.treatments).flatMap((note) =>
    noted("summary", note, facts.today, { opening: `Treatment on ${plainDateWords(note.on)}` }),
  );
}

/** "every day", "on three days a week", "14 times a week". */
function oftenWords({ sessionsPerWeek }: ProgrammeFact): string {
  if (sessionsPerWeek === 7) return "every day";
  if (sessionsPerWeek > 7) return `${sessionsPerWeek} times a week`;
  return `on ${numberWord(sessionsPerWeek)} ${sessionsPerWeek === 1 ? "day" : "days"} a week`;
}

function programmeWords(programme: ProgrammeFact): string {
  const { exercises, rounds, sessionSeconds } = programme;
  const minutes = Math.round(sessionSeconds / 60);
  const parts = [
    `Home programme of ${numberWord(exercises.length)} ${exercises.length === 1 ? "exercise" : "exercises"}`,
    rounds > 1 ? `${numberWord(rounds)} rounds` : "",
    `about ${minutes} ${minutes === 1 ? "minute" : "minutes"} a session`,
    oftenWords(programme),
  ];
  return `${parts.filter((part) => part !== "").join(", ")}: ${listWords(exercises)}`;
}

export function advice(facts: DischargeFacts): LetterSentence[] {
  const { programme } = facts;
  const said = withoutRepeats(facts.advice).flatMap((note) => noted("advice", note, facts.today));
  if (!programme || programme.exercises.length === 0) return said;
  const label = `Programme, ${shortDate(programme.on, facts.today)}`;
  const source: LetterSource = { kind: "programme", id: programme.programmeId, label };
  return [assembled("advice", "programme", programmeWords(programme), source), ...said];
}

/** What was decided, then one action for each: doctor and patient are never left to guess which is theirs. */
export function plan(facts: DischargeFacts): LetterSentence[] {
  const source: LetterSource = { kind: "episode", id: facts.episode.id, label: "Episode" };
  const isAlerted = facts.episode.redFlags.present.length > 0;
  const sentences = [assembled("plan", "discharge", "Discharged from physiotherapy", source, "practice")];
  if (facts.plan) sentences.push(...noted("plan", facts.plan, facts.today, { actor: "practice" }));
  sentences.push(
    assembled(
      "plan",
      "gp",
      isAlerted ? "Please review the warning signs under Safety alerts" : "No action is asked of you",
      source,
      "gp",
    ),
  );
  if (facts.programme) {
    const { programmeId, on } = facts.programme;
    const label = `Programme, ${shortDate(on, facts.today)}`;
    sentences.push(
      assembled(
        "plan",
        "patient-programme",
        `Keep up the home programme ${oftenWords(facts.programme)}`,
        { kind: "programme", id: programmeId, label },
        "patient",
      ),
    );
  }
  sentences.push(
    assembled(
      "plan",
      "patient-return",
      "Contact us or the GP if the problem comes back or gets worse",
      source,
      "patient",
    ),
  );
  return sentences;
}
