import { can } from "@withy/core/access/can";
import { titleDate } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { getDiaryDay } from "@withy/services/diary";
import { listSites } from "@withy/services/practices";
import type { Metadata } from "next";
import { DayScreen } from "@/features/diary/components/day-screen";
import { readDayAddress } from "@/features/diary/day-address";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/diary.css";
import "@/features/diary/day-grid.css";
import "@/features/diary/day-cells.css";
import "@/features/diary/day-sheet.css";
import "@/features/diary/desk.css";
import "@/features/diary/diary-narrow.css";

export async function generateMetadata({ searchParams }: { searchParams: SearchParams }): Promise<Metadata> {
  const { day } = readDayAddress(queryOf(await searchParams));
  return { title: day ? titleDate(day) : "Diary" };
}

export default async function DiaryPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.read");
  const { day, siteIds, by } = readDayAddress(queryOf(await searchParams));
  const filters = { day, siteIds, by };
  const [view, sites] = await Promise.all([
    orNotFound(getDiaryDay(ctx, { ...filters, siteIds: [...siteIds] })),
    listSites(ctx, {}),
  ]);
  return (
    <DayScreen
      first={{ filters, day: view }}
      sites={sites.map((site) => ({ id: site.id, name: site.name }))}
      today={dayOf(ctx.clock.now(), view.sites[0]?.zone ?? ctx.zone)}
      may={{
        book: can(ctx.roles, "diary.book"),
        mark: can(ctx.roles, "diary.mark"),
        cancel: can(ctx.roles, "diary.cancel"),
      }}
    />
  );
}
