import { exerciseSearchInput } from "@withy/contracts/programmes";
import { getExerciseLibrary } from "@withy/services/clinical";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { LibraryBrowser } from "@/features/programmes/components/library-browser";
import { requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Exercises" };

export default async function ExercisesPage({ searchParams }: PageProps<"/exercises">) {
  const ctx = await requireContext("clinical.read");
  // A hand-typed or old address with words that mean nothing shows everything.
  const asked = exerciseSearchInput.safeParse(await searchParams);
  const { equipment, words, region, kind } = asked.success ? asked.data : exerciseSearchInput.parse({});
  const first = {
    ...(words ? { words } : {}),
    ...(region ? { region } : {}),
    ...(kind ? { kind } : {}),
    ...(equipment === "none" ? { equipment } : {}),
  };
  const view = await getExerciseLibrary(ctx, first);
  return (
    <Page>
      <PageTitle title="Exercises" lead="Written here, each with easier and harder forms" />
      <PageBody>
        <LibraryBrowser first={first} view={view} />
      </PageBody>
    </Page>
  );
}
