import { dayOf } from "@withy/core/zoned-time";
import { getBookingChoices, getCoverPlan, listCoverPlans } from "@withy/services/diary";
import type { Metadata } from "next";
import { CoverScreen } from "@/features/diary/components/cover-screen";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/cover.css";

export const metadata: Metadata = { title: "Arrange cover" };

export default async function CoverPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.book");
  const coverPlanId = queryOf(await searchParams).get("plan");
  const [choices, plan, plans] = await Promise.all([
    getBookingChoices(ctx, {}),
    coverPlanId ? orNotFound(getCoverPlan(ctx, { coverPlanId })) : null,
    coverPlanId ? [] : listCoverPlans(ctx, {}),
  ]);
  const today = choices.sites[0]?.today ?? dayOf(ctx.clock.now(), ctx.zone);
  return <CoverScreen choices={choices} plan={plan} plans={plans} today={today} />;
}
