import type { LetterActor, LetterCheck, LetterSection } from "@withy/contracts/letters";
import { type Refusal, refusal } from "@withy/core/refusal";
import type { Side } from "./discharge-facts";
import { numberWord } from "./wording";

export interface LetterToCheck {
  readonly state: "draft" | "signed";
  readonly authorId: string;
  readonly authorName: string;
  readonly recipientName: string;
  readonly sections: readonly LetterSection[];
  readonly side: Side;
  readonly staleCount: number;
  readonly unsignedNotes: number;
  readonly visitsBooked: number;
}

export interface Signer {
  readonly id: string;
  readonly registrationNumber: string | null;
}

const counted = (n: number, one: string, many: string): string =>
  `${n === 1 ? "one" : numberWord(n)} ${n === 1 ? one : many}`;
const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

function hasAction(sections: readonly LetterSection[], actor: LetterActor): boolean {
  return sections.some(
    (section) => section.key === "plan" && section.sentences.some((s) => s.actor === actor && s.text !== ""),
  );
}

/** How often the letter names the other side than the episode's: a wrong side is the error that harms. */
export function otherSideMentions(sections: readonly LetterSection[], side: Side): number {
  if (side !== "left" && side !== "right") return 0;
  const other = side === "left" ? /\bright\b/gi : /\bleft\b/gi;
  return sections
    .flatMap((section) => section.sentences)
    .reduce((sum, s) => sum + (s.text.match(other)?.length ?? 0), 0);
}

/** What to look at before signing. What blocks must be put right; the rest is for the writer's eye. */
export function letterChecks(letter: LetterToCheck): LetterCheck[] {
  const { sections, side, staleCount, unsignedNotes, visitsBooked } = letter;
  const said = sections.filter((section) => section.sentences.some((sentence) => sentence.text !== ""));
  const other = otherSideMentions(sections, side);
  const line = (key: string, isOk: boolean, blocks: boolean, good: string, bad: string): LetterCheck => ({
    key,
    isOk,
    blocks,
    words: isOk ? good : bad,
  });
  return [
    line(
      "recipient",
      letter.recipientName.trim() !== "",
      true,
      `To ${letter.recipientName}`,
      "Enter who the letter is to.",
    ),
    line(
      "diagnosis",
      said.some((s) => s.key === "diagnoses"),
      true,
      "The diagnosis is named",
      "Say what the diagnosis or the problem is.",
    ),
    line(
      "gp-action",
      hasAction(sections, "gp"),
      true,
      "The GP’s part is said",
      "Say what the GP should do, or that nothing is asked.",
    ),
    line(
      "patient-action",
      hasAction(sections, "patient"),
      true,
      "The patient’s part is said",
      "Say what the patient should do.",
    ),
    line(
      "stale",
      staleCount === 0,
      true,
      "Every sentence agrees with the record",
      `${capitalised(counted(staleCount, "sentence is", "sentences are"))} out of date. Take the record’s words, or keep yours and say why.`,
    ),
    line(
      "notes",
      unsignedNotes === 0,
      true,
      "Every note is signed",
      `${capitalised(counted(unsignedNotes, "note is", "notes are"))} not signed, so the letter cannot speak of ${unsignedNotes === 1 ? "it" : "them"}. Sign first.`,
    ),
    line(
      "side",
      other === 0,
      false,
      side === "left" || side === "right" ? `No word of the other side than ${side}` : "No side to mix up",
      `The letter is about the ${side} side and says ${side === "left" ? "right" : "left"} ${counted(other, "time", "times")}. Look again.`,
    ),
    line(
      "visits",
      visitsBooked === 0,
      false,
      "No visit is booked",
      `${capitalised(counted(visitsBooked, "visit is", "visits are"))} still booked. Cancel what is not needed.`,
    ),
  ];
}

/** Why this person may not change the letter, or null. */
export function checkWrite(
  letter: Pick<LetterToCheck, "state" | "authorId" | "authorName">,
  staffMemberId: string,
): Refusal | null {
  if (letter.state === "signed")
    return refusal(
      "letter-signed",
      "This letter is signed and cannot be changed. Write a new one to correct it.",
    );
  if (letter.authorId === staffMemberId) return null;
  return refusal("not-yours", `This letter is ${letter.authorName}’s. Only its writer changes and signs it.`);
}

/** Why the letter cannot be signed by this person as it stands, or null. */
export function checkSign(letter: LetterToCheck, signer: Signer): Refusal | null {
  const write = checkWrite(letter, signer.id);
  if (write) return write;
  if (signer.registrationNumber === null) {
    return refusal(
      "not-registered",
      "A letter is signed under a registration number, and none is on your account. Ask the practice owner to add it.",
    );
  }
  const wrong = letterChecks(letter).find((check) => check.blocks && !check.isOk);
  return wrong ? refusal(`letter-${wrong.key}`, wrong.words) : null;
}

export interface Sending {
  readonly state: "draft" | "signed";
  readonly channel: "email" | "print";
  readonly address: string | null;
  /** Who would get it: "the surgery", "the patient". */
  readonly whose: string;
  readonly isRefusedByPatient: boolean;
}

/** Why the letter cannot go to this reader by this way, or null. */
export function checkSend({ state, channel, address, whose, isRefusedByPatient }: Sending): Refusal | null {
  if (state !== "signed")
    return refusal("letter-not-signed", "Sign the letter first. Only a signed letter is sent.");
  if (isRefusedByPatient) {
    return refusal(
      "consent-withdrawn",
      `The patient has withdrawn consent for this letter to go to ${whose}. Ask the patient, record the consent, then send.`,
    );
  }
  if (channel === "email" && address === null) {
    return refusal(
      "no-address",
      `There is no e-mail address for ${whose}. Print and post it, or add the address to the record and send again.`,
    );
  }
  return null;
}
