import type { LetterView } from "@withy/contracts/letters";
import { momentWords } from "../letter-words";

export function Signature({ letter }: { letter: LetterView }) {
  const { author, signedAt, signedName, registrationNumber } = letter;
  return (
    <div className="letter-signature">
      <p>Yours sincerely</p>
      <p className="letter-signed">
        {signedAt ? `Signed electronically on ${momentWords(signedAt, letter.zone)}` : "Not signed"}
      </p>
      <p>
        {signedName ?? author.name}, {author.jobTitle}
        {registrationNumber && `, HCPC ${registrationNumber}`}
      </p>
    </div>
  );
}
