import type { CourseRow } from "@withy/contracts/diary";
import { plainDateWords } from "@withy/core/date-words";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { rhythmWords } from "../course-wish";

export interface PatientCoursesProps {
  patientId: string;
  courses: readonly CourseRow[];
  mayBook: boolean;
}

/** The courses of a patient beside the record, and the way to book another. */
export function PatientCourses({ patientId, courses, mayBook }: PatientCoursesProps) {
  if (courses.length === 0 && !mayBook) return null;
  return (
    <section aria-label="Courses of visits">
      <SectionHead title="Courses" />
      <dl className="facts">
        {courses.map((course) => (
          <Course key={course.id} course={course} />
        ))}
        {mayBook && (
          <>
            <dt>New</dt>
            <dd>
              <Link href={`/diary/course?patient=${patientId}`}>Book a course</Link>
            </dd>
          </>
        )}
      </dl>
    </section>
  );
}

function Course({ course }: { course: CourseRow }) {
  const from = course.firstDay === null ? "all cancelled" : `from ${plainDateWords(course.firstDay)}`;
  const rest = course.restVisits === 0 ? "none to come" : `${course.restVisits} to come`;
  return (
    <>
      <dt>{course.plannedVisits} visits</dt>
      <dd>
        <Link href={`/diary/course/${course.id}`}>
          {course.serviceName} with {course.therapistName}
        </Link>
        <span className="soft small num block">
          {rhythmWords(course.rhythm)} at {course.startTime}, {from}, {rest}
        </span>
      </dd>
    </>
  );
}
