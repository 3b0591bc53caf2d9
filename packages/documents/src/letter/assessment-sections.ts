import type { LetterSentence, LetterSource } from "@withy/contracts/letters";
import { plainDateWords, shortDate } from "@withy/core/date-words";
import type { DischargeFacts, MeasuredFinding, MeasureFact } from "./discharge-facts";
import { assembled, noteSource, sideWords } from "./wording";

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
  return facts.history.map((note) =>
    assembled("history", note.noteId, note.text, noteSource(note, facts.today)),
  );
}

export function concerns(facts: DischargeFacts): LetterSentence[] {
  return facts.episode.goals.map((goal, index) => {
    const outcome = goal.metOn ? `met by ${plainDateWords(goal.metOn)}` : "not met yet";
    const text = goal.text.trim().replace(/[.\s]+$/, "");
    return assembled("concerns", `goal-${index + 1}`, `Goal: ${text} (${outcome})`, episodeSource(facts));
  });
}

function findingWords({ name, unit, first, last }: MeasuredFinding): string {
  const now = `${name}: ${last.value}${unit} on ${plainDateWords(last.on)}`;
  return first.on === last.on ? now : `${now} (${first.value}${unit} on ${plainDateWords(first.on)})`;
}

export function findings(facts: DischargeFacts): LetterSentence[] {
  const { first, last } = facts.examined;
  const noted = [
    ...(first
      ? [assembled("findings", "first", `At the first visit: ${first.text}`, noteSource(first, facts.today))]
      : []),
    ...(last && last.noteId !== first?.noteId
      ? [assembled("findings", "last", `At the last visit: ${last.text}`, noteSource(last, facts.today))]
      : []),
  ];
  const measured = facts.findings.map((finding) =>
    assembled("findings", finding.key, findingWords(finding), {
      kind: "note",
      id: finding.last.noteId,
      label: `Note, ${shortDate(finding.last.on, facts.today)}`,
    }),
  );
  return [...noted, ...measured];
}

function measureWords({ name, scale, first, last, timesTaken, change, standing }: MeasureFact): string {
  const unit = scale === "" ? "" : ` ${scale}`;
  const scores =
    timesTaken === 1
      ? `${name}: ${last.score}${unit} on ${plainDateWords(last.on)}.`
      : `${name}: ${first.score} on ${plainDateWords(first.on)}, ${last.score} on ${plainDateWords(last.on)}${unit === "" ? "" : `,${unit}`}.`;
  return [scores, change, standing].filter((part) => part !== null && part !== "").join(" ");
}

export function scales(facts: DischargeFacts): LetterSentence[] {
  return facts.measures.map((measure) =>
    assembled("scales", measure.key, measureWords(measure), {
      kind: "measure",
      id: measure.last.recordId,
      label: `${measure.name}, ${shortDate(measure.last.on, facts.today)}`.slice(0, 80),
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
    ...say("not-asked", "Warning signs not asked about", notAsked),
  ];
  return said.length > 0
    ? said
    : [assembled("safety", "none", "No check for warning signs is on record", source)];
}

export function allergies(facts: DischargeFacts): LetterSentence[] {
  const source: LetterSource = { kind: "patient", id: facts.patient.id, label: "Patient record" };
  const words = { none: "None known", "not-asked": "Not asked by this service" } as const;
  const { allergies: known } = facts;
  return [assembled("allergies", "all", known.known === "listed" ? known.text : words[known.known], source)];
}
