import { randomInt } from "node:crypto";

/** No letter or figure that can be taken for another when it is read out over the phone. */
const alphabet = "23456789ABCDEFGHJKMNPQRSTVWXYZ";

/** "L-7KX2QD": says nothing about the patient, so it may stand in an e-mail. */
export function newLetterReference(): string {
  return `L-${Array.from({ length: 6 }, () => alphabet[randomInt(alphabet.length)]).join("")}`;
}
