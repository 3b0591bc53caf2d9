import type { LetterRow } from "@withy/contracts/letters";
import { Glyph } from "@withy/ui/glyph";
import { Line } from "@withy/ui/line";
import Link from "next/link";
import { shortDay } from "../letter-words";

/** One letter of a list: when, what, about whom, to whom, and where it stands. */
export function LetterLine({
  letter,
  zone,
  hidePatient = false,
}: {
  letter: LetterRow;
  zone: string;
  hidePatient?: boolean;
}) {
  return (
    <Line
      gutter={shortDay(letter.signedAt ?? letter.updatedAt, zone)}
      note
      className="letter-row letter-entry"
    >
      <span className="grow">
        <Link href={`/letters/${letter.id}`}>{letter.title}</Link>
        {!hidePatient && (
          <>
            <span className="letter-comma">, </span>
            <span className="letter-person">{letter.patientName}</span>
          </>
        )}
        <span className="letter-person soft"> to {letter.recipientName || "nobody yet"}</span>
      </span>
      <span className="letter-author soft">{letter.authorName}</span>
      <span className={letter.needsAttention ? "letter-standing warn" : "letter-standing"}>
        {letter.needsAttention && <Glyph name="warn" />} {letter.standing}
      </span>
    </Line>
  );
}
