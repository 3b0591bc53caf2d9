"use client";
import type { AppointmentView } from "@withy/contracts/diary";
import { plainDateWords, shortDate } from "@withy/core/date-words";
import { ageOn } from "@withy/core/plain-date";
import { stateFacts } from "@withy/diary/appointment-states";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, ButtonLink } from "@withy/ui/button";
import { Key } from "@withy/ui/key";
import { Money } from "@withy/ui/money";
import { Skeleton } from "@withy/ui/skeleton";
import Link from "next/link";
import { type ReactNode, useEffect, useRef } from "react";
import { problemItems } from "@/api/form-problems";
import { useAppointment } from "../hooks/use-appointment";
import { useEscape } from "../hooks/use-escape";
import { phoneWords } from "../phone-words";
import { offerHref } from "../waiting-address";
import { PresenceLine } from "./presence-line";
import { SheetStates, type SheetVerbs } from "./sheet-states";

export interface AppointmentSheetProps {
  appointmentId: string;
  today: string;
  verbs: SheetVerbs;
  /** Whether one of its dialogs is open. */
  isEditing: boolean;
  onMove: (() => void) | undefined;
  onClose: () => void;
}

/** One visit, laid on the page: who, when, what may be done now, each verb with its key. */
export function AppointmentSheet(props: AppointmentSheetProps) {
  const { appointmentId, today, verbs, isEditing, onMove, onClose } = props;
  const query = useAppointment(appointmentId);
  const heading = useRef<HTMLHeadingElement>(null);
  const isThere = query.data !== undefined;
  useEffect(() => {
    if (isThere) heading.current?.focus({ preventScroll: true });
  }, [appointmentId, isThere]);
  const version = query.data?.version;
  // The button that was pressed may be gone with the state it belonged to; the focus must not go with it.
  useEffect(() => {
    if (version !== undefined && document.activeElement === document.body)
      heading.current?.focus({ preventScroll: true });
  }, [version]);
  useEscape(onClose);
  return (
    <aside className="sheetside" aria-label="The appointment">
      {query.error && <AlertLine tone="danger">{problemItems(query.error)[0]?.message}</AlertLine>}
      {query.isPending && <Skeleton lines={8} label="Loading the appointment" />}
      {query.data && (
        <>
          <Who view={query.data} today={today} heading={heading} />
          <When view={query.data} canOffer={verbs.canBook} />
          <PresenceLine appointmentId={appointmentId} isEditing={isEditing} />
          <SheetStates view={query.data} verbs={verbs} />
          <Owed view={query.data} />
          <Around view={query.data} today={today} />
        </>
      )}
      <div className="fin">
        {query.data && verbs.canBook && (
          <ButtonLink kind="primary" as={Link} href={bookNextHref(query.data)} shortcut="B">
            Book next
          </ButtonLink>
        )}
        {query.data?.canMove && onMove && (
          <Button shortcut="M" onClick={onMove}>
            Move
          </Button>
        )}
        <Button kind="plain" shortcut="Esc" onClick={onClose}>
          Close
        </Button>
      </div>
    </aside>
  );
}

/** Another visit like this one; after a first assessment the caller says what it is for. */
function bookNextHref(view: AppointmentView): string {
  const query = new URLSearchParams({ patient: view.patient.id });
  if (view.service.kind === "follow-up") query.set("service", view.service.id);
  return `/diary/find?${query}`;
}

function Row({ gutter, children }: { gutter?: ReactNode; children: ReactNode }) {
  return (
    <div className="r">
      <span>{gutter}</span>
      <div className="ln">{children}</div>
    </div>
  );
}

function Who({
  view,
  today,
  heading,
}: {
  view: AppointmentView;
  today: string;
  heading: React.RefObject<HTMLHeadingElement | null>;
}) {
  const { patient } = view;
  return (
    <div className="part">
      <div className="r">
        <span>{view.startTime}</span>
        <div>
          <h2 ref={heading} tabIndex={-1}>
            <Link href={`/patients/${patient.id}`}>{patient.name}</Link> <Key>O</Key>
          </h2>
          <p className="small soft num">
            {patient.preferredName && `Likes “${patient.preferredName}”. `}
            Born {plainDateWords(patient.bornOn)}, {ageOn(patient.bornOn, today)}
          </p>
        </div>
      </div>
      {[patient.communicationNeeds, ...patient.alerts]
        .filter((text): text is string => Boolean(text))
        .map((text) => (
          <div key={text} className="sheetalert">
            <AlertLine>{text}</AlertLine>
          </div>
        ))}
    </div>
  );
}

/** The time of a cancelled visit that is still to come may go to someone who waits. */
const isFreed = (view: AppointmentView): boolean =>
  view.state === "cancelled" && Date.parse(view.startsAt) > Date.now();

function offerOf(view: AppointmentView): string {
  const { site, therapist, startsAt, id } = view;
  return offerHref({ siteId: site.id, therapistId: therapist.id, startsAt, freedById: id });
}

function When({ view, canOffer }: { view: AppointmentView; canOffer: boolean }) {
  return (
    <div className="part">
      <Row gutter="until">
        {view.endTime}, {view.service.name.toLowerCase()}, {view.durationMinutes} minutes
      </Row>
      <Row gutter="with">
        {view.therapist.name}, in {view.room.name}, {view.site.name}
      </Row>
      {view.courseId && (
        <Row gutter="course">
          <Link href={`/diary/course/${view.courseId}`}>One visit of a course</Link>
        </Row>
      )}
      {view.patient.phone && (
        <Row gutter="tel">
          <a className="num" href={`tel:${view.patient.phone}`}>
            {phoneWords(view.patient.phone)}
          </a>
        </Row>
      )}
      {view.cancellation && (
        <Row gutter="why">
          Cancelled by the {view.cancellation.by}
          {view.cancellation.isLate ? ", late" : ""}: {view.cancellation.reason}
        </Row>
      )}
      {canOffer && isFreed(view) && (
        <Row>
          <Link href={offerOf(view)}>Offer this time to the waiting list</Link>
        </Row>
      )}
      {view.overrideReason && <Row gutter="note">Outside the usual hours: {view.overrideReason}</Row>}
    </div>
  );
}

function Owed({ view }: { view: AppointmentView }) {
  if (view.owesPence === null || view.owesPence === 0) return null;
  return (
    <div className="part">
      <Row gutter="owes">
        <Money pence={view.owesPence} strong />{" "}
        <Link href={`/patients/${view.patient.id}/money`}>Open the account</Link>
      </Row>
    </div>
  );
}

function Around({ view, today }: { view: AppointmentView; today: string }) {
  const { previousVisit: before, nextVisit: after, deskNote } = view;
  if (!before && !after && !deskNote) return null;
  return (
    <div className="part">
      {before && (
        <Row gutter={shortDate(before.day, today)}>
          {stateFacts[before.state].word}, {before.startTime}, {before.therapistName}
        </Row>
      )}
      {after && (
        <Row gutter={shortDate(after.day, today)}>
          {stateFacts[after.state].word}, {after.startTime}, {after.therapistName}
        </Row>
      )}
      {deskNote && (
        <Row gutter="desk">
          <em className="serif">{deskNote}</em>
        </Row>
      )}
    </div>
  );
}
