import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { getBookingChoices } from "@withy/services/diary";
import { getPatient } from "@withy/services/patients";
import type { Metadata } from "next";
import { CourseScreen } from "@/features/diary/components/course-screen";
import { readCourseWish } from "@/features/diary/course-wish";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/course.css";

export const metadata: Metadata = { title: "Book a course" };

export default async function BookCoursePage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.book");
  const query = queryOf(await searchParams);
  const patientId = query.get("patient");
  const [choices, patient] = await Promise.all([
    getBookingChoices(ctx, {}),
    patientId ? orNotFound(getPatient(ctx, { patientId })) : null,
  ]);
  const start = readCourseWish(query);
  const onlySite = choices.sites.length === 1 ? choices.sites[0]?.id : undefined;
  return (
    <CourseScreen
      choices={choices}
      start={{ ...start, siteId: start.siteId || (onlySite ?? "") }}
      startPatient={
        patient && { id: patient.id, label: patient.name, detail: `born ${plainDateWords(patient.bornOn)}` }
      }
      today={choices.sites[0]?.today ?? dayOf(ctx.clock.now(), ctx.zone)}
    />
  );
}
