import { can } from "@withy/core/access/can";
import { dayOf, isPlainDate } from "@withy/core/zoned-time";
import { getDiaryDay, getTherapistWeek } from "@withy/services/diary";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { WeekScreen } from "@/features/diary/components/week-screen";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/diary.css";
import "@/features/diary/week.css";

export const metadata: Metadata = { title: "Week" };

export default async function WeekPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.read");
  const query = queryOf(await searchParams);
  const today = dayOf(ctx.clock.now(), ctx.zone);
  const asked = query.get("day");
  const day = asked && isPlainDate(asked) ? asked : today;
  const here = await getDiaryDay(ctx, { day });
  const therapists = here.columns.map((column) => ({ id: column.id, name: column.name }));
  const own = therapists.find((therapist) => therapist.id === ctx.staffMemberId);
  const therapistId = query.get("therapist") ?? own?.id ?? therapists[0]?.id;
  if (!therapistId) {
    return (
      <Page>
        <PageTitle title="Week" />
        <PageBody>
          <EmptyState title="No therapist works here in this week.">
            Choose another desk in the head, or another week.
          </EmptyState>
        </PageBody>
      </Page>
    );
  }
  const week = await orNotFound(getTherapistWeek(ctx, { therapistId, day }));
  const isListed = therapists.some((therapist) => therapist.id === week.therapist.id);
  return (
    <WeekScreen
      first={week}
      day={day}
      today={today}
      therapists={isListed ? therapists : [...therapists, week.therapist]}
      canBook={can(ctx.roles, "diary.book")}
    />
  );
}
