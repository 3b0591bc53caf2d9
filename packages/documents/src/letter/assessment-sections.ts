import type { LetterSentence, LetterSource } from "@withy/contracts/letters";
import { plainDateWords, shortDate } from "@withy/core/date-words";
import type { DischargeFacts, MeasureFact, NotedText } from "./discharge-facts";
import { assembled, capital, noted, numberWord, sideWords } from "./wording";

const episodeSource = ({ episode }: DischargeFacts): LetterSource => ({
  kind: "episode",
  id: episode.id,
  label: "Episode",
});

export function diagnoses(facts: DischargeFacts): LetterSentence[] {
  const { problem, side } = facts.episode;
  return [assembled("diagnoses", "problem", `${problem}${sideWords(side, problem)}`, episodeSource(facts))];
}

export function referrer(facts: DischargeFacts): LetterSentence[] {
  const { referral } = facts.episode;
  const on = referral.on ? ` on ${plainDateWords(referral.on)}` : "";
  const label = referral.on ? `Referral, ${shortDate(referral.on, facts.today)}` : "Referral";
  const source: LetterSource = { kind: "episode", id: facts.episode.id, label };
  const how =
    referral.source === "self"
      ? `${facts.patient.name} came without a referral`
      : facts.recipientIsReferrer
        ? `You referred ${facts.patient.name}${on}`
        : `${facts.patient.name} was referred by ${referral.by ?? referrerWords[referral.source]}${on}`;
  const sentences = [assembled("referrer", "who", how, source)];
  if (referral.reason?.trim())
    sentences.push(assembled("referrer", "reason", `Reason: ${referral.reason}`, source));
  return sentences;
}

const referrerWords: Record<DischargeFacts["episode"]["referral"]["source"], string> = {
  gp: "the GP practice",
  self: "",
  insurer: "an insurer",
  employer: "an employer",
  consultant: "a consultant",
  other: "another service",
};

export function history(facts: DischargeFacts): LetterSentence[] {
  return facts.history.flatMap((note) => noted("history", note, facts.today));
}

export function concerns(facts: DischargeFacts): LetterSentence[] {
  return facts.episode.goals.map((goal, index) => {
    const outcome = goal.metOn ? `met by ${plainDateWords(goal.metOn)}` : "not met yet";
    const text = goal.text.trim().replace(/[.\s]+$/, "");
    return assembled("concerns", `goal-${index + 1}`, `Goal: ${text} (${outcome})`, episodeSource(facts));
  });
}

export function findings(facts: DischargeFacts): LetterSentence[] {
  const { first, last } = facts.examined;
  const at = (note: NotedText | null, opening: string) =>
    note ? noted("findings", note, facts.today, { opening }) : [];
  const isOnce = last?.noteId === first?.noteId;
  return [...at(first, "At the first visit"), ...(isOnce ? [] : at(last, "At the last visit"))];
}

function measureWords({ name, scale, first, last, timesTaken, change, standing }: MeasureFact): string {
  const unit = scale === "" ? "" : ` ${scale}`;
  const scores =
    timesTaken === 1
      ? `${name}: ${last.score}${unit} on ${plainDateWords(last.on)}.`
      : `${name}: ${first.score}${unit} on ${plainDateWords(first.on)}, ${last.score} on ${plainDateWords(last.on)}.`;
  return [scores, change, standing].filter((part) => part !== null && part !== "").join(" ");
}

export function scales(facts: DischargeFacts): LetterSentence[] {
  return facts.measures.map((measure) =>
    assembled("scales", measure.key, measureWords(measure), {
      kind: "measure",
      id: measure.last.recordId,
      label: `${measure.shortName}, ${shortDate(measure.last.on, facts.today)}`.slice(0, 80),
    }),
  );
}

export function safety(facts: DischargeFacts): LetterSentence[] {
  const { present, absent, notAsked } = facts.episode.redFlags;
  const source = episodeSource(facts);
  const say = (slug: string, opening: string, flags: readonly string[]) =>
    flags.length === 0 ? [] : [assembled("safety", slug, `${opening}: ${flags.join("; ")}`, source)];
  const said = [
    ...say("present", "Warning signs present", present),
    ...say("absent", "Warning signs asked about and absent", absent),
  ];
  if (said.length > 0 && notAsked > 0) {
    const text = `${capital(numberWord(notAsked))} other ${notAsked === 1 ? "sign was" : "signs were"} not asked about`;
    said.push(assembled("safety", "not-asked", text, source));
  }
  return said.length > 0
    ? said
    : [assembled("safety", "none", "No check for warning signs is on record", source)];
}

/** The record has no field for allergies: the letter must not let silence read as "none known". */
export function allergies(facts: DischargeFacts): LetterSentence[] {
  const source: LetterSource = { kind: "patient", id: facts.patient.id, label: "Patient record" };
  const where = facts.history.length > 0 ? "; see Relevant history for what was asked" : "";
  return [assembled("allergies", "all", `Not recorded separately by this service${where}`, source)];
}
