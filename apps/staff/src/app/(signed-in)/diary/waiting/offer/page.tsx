import type { OfferMatchesView } from "@withy/contracts/diary";
import { isAppError } from "@withy/core/errors";
import type { Context } from "@withy/services/context";
import { listOfferMatches } from "@withy/services/diary";
import { ButtonLink } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { OfferScreen } from "@/features/diary/components/offer-screen";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/waiting.css";

export const metadata: Metadata = { title: "Offer a time" };

/** The matches, or the sentence that says why this time cannot be offered. */
async function readMatches(ctx: Context, query: URLSearchParams): Promise<OfferMatchesView | string> {
  const [siteId, therapistId, startsAt] = ["site", "therapist", "at"].map((name) => query.get(name) ?? "");
  try {
    return await listOfferMatches(ctx, {
      siteId: siteId ?? "",
      therapistId: therapistId ?? "",
      startsAt: startsAt ?? "",
    });
  } catch (error) {
    if (isAppError(error) && error.code === "refused") return error.message;
    throw error;
  }
}

export default async function OfferTimePage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.book");
  const query = queryOf(await searchParams);
  const view = await orNotFound(readMatches(ctx, query));
  if (typeof view === "string")
    return (
      <Page>
        <PageTitle title="Offer a time" />
        <PageBody>
          <EmptyState
            title="This time cannot be offered."
            action={
              <ButtonLink as={Link} size="small" href="/diary/waiting">
                Back to the waiting list
              </ButtonLink>
            }
          >
            {view}
          </EmptyState>
        </PageBody>
      </Page>
    );
  if (view.openRoundId) redirect(`/diary/waiting#round-${view.openRoundId}`);
  return <OfferScreen view={view} freedById={query.get("freed")} zone={ctx.zone} />;
}
