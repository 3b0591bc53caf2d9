"use client";
import type { CourseView, CourseVisit } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, Buttons } from "@withy/ui/button";
import { Page, PageTitle } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { AppointmentStateMark } from "@/components/appointment-state-mark";
import { undoCancelCourse } from "../course-client";
import { rhythmWords } from "../course-wish";
import { useCourse, useCourseAct } from "../hooks/use-course";

const ExtendDialog = dynamic(() => import("./extend-dialog").then((m) => m.ExtendDialog));
const ShiftDialog = dynamic(() => import("./shift-dialog").then((m) => m.ShiftDialog));
const CancelCourseDialog = dynamic(() => import("./cancel-course-dialog").then((m) => m.CancelCourseDialog));

/** One course: its visits, and what may be done with those that are still to come. */
export function CoursePage({ first }: { first: CourseView }) {
  const course = useCourse(first);
  const [dialog, setDialog] = useState<"extend" | "shift" | "cancel" | null>(null);
  const undo = useCourseAct(
    undoCancelCourse,
    (answer) => answer.course,
    (view) => `Cancelled rest of the course of ${view.patient.name} brought back`,
  );
  const rest = course.visits.filter((visit) => visit.isRest).length;
  const close = () => setDialog(null);
  return (
    <Page>
      <PageTitle
        title={`Course of ${course.patient.name}`}
        lead={`${course.service.name} with ${course.therapist.name}, ${course.site.name}. ${rhythmWords(course.rhythm)} at ${course.startTime}.`}
      />
      <div className="coursebody">
        {undo.error && (
          <AlertLine tone="danger" live>
            {problemItems(undo.error)[0]?.message}
          </AlertLine>
        )}
        {undo.data && undo.data.lost.length > 0 && <Lost lost={undo.data.lost} />}
        <Buttons>
          {course.may.book && (
            <Button kind="primary" onClick={() => setDialog("extend")}>
              Add visits
            </Button>
          )}
          {course.may.book && rest > 0 && <Button onClick={() => setDialog("shift")}>Shift the rest</Button>}
          {course.may.cancel && rest > 0 && (
            <Button onClick={() => setDialog("cancel")}>Cancel the rest</Button>
          )}
          {course.may.cancel && course.undoableVisits > 0 && (
            <Button
              busy={undo.isPending}
              onClick={() => undo.mutate({ id: course.id, version: course.version })}
            >
              Undo the cancelling of{" "}
              {course.undoableVisits === 1 ? "1 visit" : `${course.undoableVisits} visits`}
            </Button>
          )}
        </Buttons>
        <SectionHead
          title={course.visits.length === 1 ? "1 visit" : `${course.visits.length} visits`}
          aside={rest === 0 ? "none still to come" : `${rest} still to come`}
        />
        <ol className="coursevisits">
          {course.visits.map((visit, n) => (
            <Visit key={visit.id} visit={visit} position={n + 1} siteId={course.site.id} />
          ))}
        </ol>
        <p className="small">
          <Link href={`/patients/${course.patient.id}`}>Open the record of {course.patient.name}</Link>
        </p>
      </div>
      {dialog === "extend" && <ExtendDialog course={course} onClose={close} />}
      {dialog === "shift" && <ShiftDialog course={course} onClose={close} />}
      {dialog === "cancel" && <CancelCourseDialog course={course} onClose={close} />}
    </Page>
  );
}

function Lost({ lost }: { lost: readonly { day: string; startTime: string; why: string }[] }) {
  return (
    <AlertLine live>
      Still cancelled:{" "}
      {lost.map((one) => `${titleDate(one.day)} at ${one.startTime}, because ${one.why}`).join("; ")}.
    </AlertLine>
  );
}

function Visit({ visit, position, siteId }: { visit: CourseVisit; position: number; siteId: string }) {
  const query = new URLSearchParams({ day: visit.day, site: siteId, at: visit.id });
  return (
    <li>
      <span className="rank num">{position}</span>
      <div className="in said">
        <Link className="num" href={`/diary?${query}`}>
          {titleDate(visit.day)}, {visit.startTime}
        </Link>
        <span className="soft small grow">
          {visit.therapistName}, {visit.roomName}
        </span>
        <AppointmentStateMark code={visit.state} />
      </div>
    </li>
  );
}
