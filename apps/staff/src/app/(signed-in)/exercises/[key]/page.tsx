import { regionWords } from "@withy/clinical/exercises/exercise";
import { findExercise } from "@withy/clinical/exercises/library";
import { getExercise } from "@withy/services/clinical";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import Link from "next/link";
import { ExerciseSheet } from "@/features/programmes/components/exercise-sheet";
import { orNotFound, requireContext } from "@/server/context";

export async function generateMetadata({ params }: PageProps<"/exercises/[key]">): Promise<Metadata> {
  return { title: findExercise((await params).key)?.name ?? "Exercise" };
}

export default async function ExercisePage({ params }: PageProps<"/exercises/[key]">) {
  const ctx = await requireContext("clinical.read");
  const exercise = await orNotFound(getExercise(ctx, { key: (await params).key }));
  return (
    <Page>
      <PageTitle
        title={exercise.name}
        note={<Link href={`/exercises?region=${exercise.region}`}>{regionWords[exercise.region]}</Link>}
        lead={exercise.kinds.join(", ")}
      />
      <PageBody>
        <ExerciseSheet exercise={exercise} />
      </PageBody>
    </Page>
  );
}
