import type { ClinicalPatient } from "@withy/contracts/clinical";
import { Glyph } from "@withy/ui/glyph";
import { Mark } from "@withy/ui/mark";
import Link from "next/link";
import { longDay } from "../site-time";

export interface PatientHeadProps {
  patient: ClinicalPatient;
  /** "Left hip": in sight at every moment. */
  place: string;
  /** The second line: the problem and the visit. */
  about: string;
}

function spaced(nhsNumber: string): string {
  return `${nhsNumber.slice(0, 3)} ${nhsNumber.slice(3, 6)} ${nhsNumber.slice(6)}`;
}

/** Who is treated and on which side, over everything that is written about them. */
export function PatientHead({ patient, place, about }: PatientHeadProps) {
  return (
    <header className="patient-head">
      <Link className="mark" href="/notes">
        <Mark />
        <span className="name">Withy</span>
        <span className="vh">, notes to sign</span>
      </Link>
      <div className="who">
        <h1>
          <Link href={`/patients/${patient.id}`}>{patient.name}</Link>
        </h1>
        <span className="side">{place}</span>
        <p className="num">
          <span>
            {patient.age}, born {longDay(patient.bornOn)}
            {patient.nhsNumber !== null && `, NHS ${spaced(patient.nhsNumber)}`}
          </span>
          <span>{about}</span>
        </p>
      </div>
      {patient.alerts.length > 0 && (
        <p className="alert">
          <Glyph name="warn" />
          <span>
            <span className="vh">Alert: </span>
            {patient.alerts.join(". ")}
          </span>
        </p>
      )}
    </header>
  );
}
