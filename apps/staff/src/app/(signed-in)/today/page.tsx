import { can } from "@withy/core/access/can";
import { listToday } from "@withy/services/diary";
import { listSites } from "@withy/services/practices";
import type { Metadata } from "next";
import { DiaryFoot } from "@/features/diary/components/diary-foot";
import { readDayAddress } from "@/features/diary/day-address";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { TodayScreen } from "@/features/today/components/today-screen";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/today/today.css";
import "@/features/diary/diary.css";

export const metadata: Metadata = { title: "Today" };

export default async function TodayPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.read");
  const { siteIds } = readDayAddress(queryOf(await searchParams));
  const [view, sites] = await Promise.all([
    orNotFound(listToday(ctx, { siteIds: [...siteIds] })),
    listSites(ctx, {}),
  ]);
  const zone = sites.find((site) => site.id === view.sites[0]?.id)?.zone ?? ctx.zone;
  return (
    <TodayScreen
      first={view}
      siteIds={siteIds}
      sites={sites.map((site) => ({ id: site.id, name: site.name }))}
      zone={zone}
      now={ctx.clock.now().toISOString()}
      may={{ book: can(ctx.roles, "diary.book"), mark: can(ctx.roles, "diary.mark") }}
      foot={<DiaryFoot siteIds={view.sites.map((site) => site.id)} canUndo={can(ctx.roles, "diary.mark")} />}
    />
  );
}
