import { getCourse } from "@withy/services/diary";
import type { Metadata } from "next";
import { CoursePage } from "@/features/diary/components/course-page";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/course.css";

export const metadata: Metadata = { title: "Course" };

export default async function OneCoursePage({ params }: PageProps<"/diary/course/[courseId]">) {
  const { courseId } = await params;
  const ctx = await requireContext("diary.read");
  return <CoursePage first={await orNotFound(getCourse(ctx, { courseId }))} />;
}
