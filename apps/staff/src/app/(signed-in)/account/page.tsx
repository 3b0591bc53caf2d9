import "@/features/practices/practices.css";
import { getMyCalendarFeed } from "@withy/services/diary";
import { listMySessions } from "@withy/services/practices";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { CalendarFeed } from "@/features/practices/components/calendar-feed";
import { PasswordChange } from "@/features/practices/components/password-change";
import { SessionList } from "@/features/practices/components/session-list";
import { requireSession } from "@/server/context";

export const metadata: Metadata = { title: "Your sign-in" };

export default async function AccountPage() {
  const { context, jobTitle, practiceName } = await requireSession();
  const [sessions, calendar] = await Promise.all([
    listMySessions(context, {}),
    getMyCalendarFeed(context, {}),
  ]);
  return (
    <Page>
      <PageTitle title="Your sign-in" lead={`${context.staffName}, ${jobTitle} at ${practiceName}`} />
      <PageBody className="stacked">
        <SessionList first={sessions} zone={context.zone} />
        {calendar.canHaveFeed && <CalendarFeed first={calendar.feed} zone={context.zone} />}
        <PasswordChange zone={context.zone} />
      </PageBody>
    </Page>
  );
}
