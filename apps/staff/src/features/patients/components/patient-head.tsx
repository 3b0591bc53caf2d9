"use client";
import type { PatientView } from "@withy/contracts/patients";
import { formatNhsNumber } from "@withy/core/identifiers/nhs-number";
import { AlertLine } from "@withy/ui/alert-line";
import { ButtonLink } from "@withy/ui/button";
import { PageTitle } from "@withy/ui/page";
import { LinkTabs } from "@withy/ui/tabs";
import Link from "next/link";
import { usePathname, useRouter } from "next/navigation";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { patientTabs } from "../patient-tabs";
import { dayAndYear } from "../short-day";

interface Props {
  patient: PatientView;
  mayEdit: boolean;
  mayBook: boolean;
}

/** Who it is, what must be seen first, and the parts of the record; stands above every page of it. */
export function PatientHead({ patient, mayEdit, mayBook }: Props) {
  const router = useRouter();
  const path = usePathname();
  const here = `/patients/${patient.id}`;
  const bookAt = `/diary/find?patient=${patient.id}`;
  useShortcut("edit", () => router.push(`${here}/edit`), mayEdit);
  useShortcut("book", () => router.push(bookAt), mayBook);
  return (
    <>
      <PageTitle
        title={patient.name}
        note={
          patient.lookedAtBy !== null && (
            <>
              opened by {patient.lookedAtBy}
              <br />
              <Link href={`${here}/looks`}>who looked</Link>
            </>
          )
        }
        lead={leadWords(patient)}
        actions={
          <>
            {mayEdit && (
              <ButtonLink size="small" href={`${here}/edit`} as={Link} shortcut="E">
                Edit
              </ButtonLink>
            )}
            {mayBook && (
              <ButtonLink size="small" href={`/diary/waiting?add=1&patient=${patient.id}`} as={Link}>
                Waiting list
              </ButtonLink>
            )}
            {mayBook && (
              <ButtonLink kind="primary" size="small" href={bookAt} as={Link} shortcut="B">
                Book
              </ButtonLink>
            )}
          </>
        }
      />
      <Alerts patient={patient} />
      <div className="ptabs">
        <LinkTabs label={`Record of ${patient.name}`} items={patientTabs(patient, path)} as={Link} />
      </div>
    </>
  );
}

function Alerts({ patient }: { patient: PatientView }) {
  const care = patient.care;
  const said = [...(care?.alerts.map((alert) => alert.text) ?? []), care?.communicationNeeds ?? ""].filter(
    Boolean,
  );
  if (said.length === 0) return null;
  return (
    <div className="palert">
      <AlertLine>{said.map((text) => text.replace(/\.$/, "")).join(". ")}.</AlertLine>
    </div>
  );
}

function leadWords(patient: PatientView): string {
  const nhs = patient.care?.nhsNumber;
  return [
    patient.preferredName && `likes “${patient.preferredName}”`,
    `${patient.ageYears}, born ${dayAndYear(patient.bornOn)}`,
    nhs && `NHS ${formatNhsNumber(nhs)}`,
  ]
    .filter(Boolean)
    .join(". ");
}
