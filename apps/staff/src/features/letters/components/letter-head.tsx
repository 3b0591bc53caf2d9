import type { LetterView } from "@withy/contracts/letters";
import { longDate, plainDateWords } from "@withy/core/date-words";
import { formatNhsNumber } from "@withy/core/identifiers/nhs-number";
import type { ReactNode } from "react";

/** The letterhead, whom it is to and whom it is about: the same lines as on paper. */
export function LetterHead({ letter, recipient }: { letter: LetterView; recipient: ReactNode }) {
  const { patient, sender } = letter;
  return (
    <>
      <header className="letter-top">
        <div>
          <p className="practice">{sender.practice}</p>
          <p className="small soft">
            {sender.siteLine}
            <br />
            {sender.contactLine}
          </p>
        </div>
        <p className="small soft right num">
          Our reference {letter.reference}
          <br />
          {longDate(letter.datedOn)}
        </p>
      </header>
      <div className="letter-parties">
        {recipient}
        <p className="letter-address">
          <b>{patient.name}</b>, born {plainDateWords(patient.bornOn)}
          {patient.nhsNumber && `\nNHS number ${formatNhsNumber(patient.nhsNumber)}`}
          {patient.addressLines.length > 0 && `\n${patient.addressLines.join(", ")}`}
        </p>
      </div>
    </>
  );
}
