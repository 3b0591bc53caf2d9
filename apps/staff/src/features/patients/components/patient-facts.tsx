import type { PatientCareView, PatientClinicalView, PatientView } from "@withy/contracts/patients";
import { longDate, plainDateWords, proseTime } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import type { ReactNode } from "react";
import { AppointmentStateMark } from "@/components/appointment-state-mark";

export interface PatientFactsProps {
  patient: PatientView;
  today: string;
  /** What other areas put beside the record, between what matters now and how to reach the person. */
  children?: ReactNode;
}

/** What matters now, how to reach the person, who pays: beside the timeline. */
export function PatientFacts({ patient, today, children }: PatientFactsProps) {
  return (
    <aside className="pfacts" aria-label="At a glance">
      {patient.care && <Now care={patient.care} clinical={patient.clinical} today={today} />}
      {children}
      <SectionHead title="Reach them" />
      <dl className="facts">
        <dt>Phone</dt>
        <dd className="num">{patient.phone ?? "There is none"}</dd>
        <dt>E-mail</dt>
        <dd>{patient.email ?? "None given"}</dd>
        <dt>Home</dt>
        <dd>{[...patient.addressLines, patient.postcode].filter(Boolean).join(", ") || "None given"}</dd>
        <dt>Prefers</dt>
        <dd>{channelWords[patient.preferredChannel]}</dd>
        {patient.care && (
          <>
            <dt>Next of kin</dt>
            <dd>{patient.care.nextOfKin ?? "None given"}</dd>
            <dt>GP</dt>
            <dd>
              {[patient.care.gpName, patient.care.gpPractice?.name].filter(Boolean).join(", ") ||
                "None given"}
            </dd>
          </>
        )}
      </dl>
      <SectionHead title="Who pays" />
      <Payer patient={patient} />
      {patient.care && <Consents care={patient.care} />}
    </aside>
  );
}

const channelWords = { email: "E-mail", text: "Text message", phone: "A phone call", post: "Post" };

interface NowProps {
  care: PatientCareView;
  clinical: PatientClinicalView | null;
  today: string;
}

function Now({ care, clinical, today }: NowProps) {
  const goals = clinical?.openEpisode?.goals ?? [];
  return (
    <>
      <SectionHead title="Now" />
      <dl className="facts">
        {goals.map((goal, i) => (
          <GoalLine key={goal.text} label={i === 0 ? "Goals" : ""} {...goal} />
        ))}
        <dt>Next visit</dt>
        <dd>
          {care.nextVisit ? (
            <>
              {care.nextVisit.day === today ? "Today" : longDate(care.nextVisit.day)},{" "}
              {proseTime(care.nextVisit.time)}, {care.nextVisit.therapistName}{" "}
              <AppointmentStateMark code={care.nextVisit.state} />
            </>
          ) : (
            "None booked"
          )}
        </dd>
        {care.usualTherapist && (
          <>
            <dt>Usually sees</dt>
            <dd>{care.usualTherapist.name}</dd>
          </>
        )}
        {clinical && clinical.draftNotes.length > 0 && (
          <>
            <dt>To do</dt>
            <dd>
              {clinical.draftNotes.map((note) => (
                <span key={note.id} className="block">
                  <Link href={`/notes/${note.id}`}>Sign the note of {plainDateWords(note.visitOn)}</Link>
                </span>
              ))}
            </dd>
          </>
        )}
      </dl>
    </>
  );
}

function GoalLine({ label, text, isMet }: { label: string; text: string; isMet: boolean }) {
  return (
    <>
      <dt>{label}</dt>
      <dd>
        {text} {isMet && <span className="soft">met</span>}
      </dd>
    </>
  );
}

function Payer({ patient: { payer } }: { patient: PatientView }) {
  if (payer === null)
    return (
      <dl className="facts">
        <dt>The patient</dt>
        <dd>Pays for each visit</dd>
      </dl>
    );
  return (
    <dl className="facts">
      <dt>{payer.kind === "insurer" ? "Insurer" : "Employer"}</dt>
      <dd>{payer.payerName}</dd>
      <dt>Policy</dt>
      <dd className="num">{payer.policyNumber ?? "None given"}</dd>
      <dt>Authorised</dt>
      <dd className="num">
        {[
          payer.authorisationCode,
          payer.sessionsAuthorised === null ? "no limit of sessions" : `${payer.sessionsAuthorised} sessions`,
        ]
          .filter(Boolean)
          .join(", ")}
      </dd>
      {payer.excessPence > 0 && (
        <>
          <dt>Excess</dt>
          <dd className="num">{formatMoney(payer.excessPence)}</dd>
        </>
      )}
    </dl>
  );
}

const consentWords = {
  treatment: "Treatment",
  "letter-to-gp": "Letter to GP",
  email: "E-mail",
  text: "Text message",
};

function Consents({ care }: { care: PatientCareView }) {
  if (care.consents.length === 0) return null;
  return (
    <>
      <SectionHead title="Consents" />
      <dl className="facts">
        {care.consents.map((consent) => (
          <ConsentLine key={consent.kind + consent.givenOn} {...consent} />
        ))}
      </dl>
    </>
  );
}

function ConsentLine({ kind, wordingVersion, givenOn }: PatientCareView["consents"][number]) {
  return (
    <>
      <dt>{consentWords[kind]}</dt>
      <dd>
        wording {wordingVersion}, {plainDateWords(givenOn)}
      </dd>
    </>
  );
}
