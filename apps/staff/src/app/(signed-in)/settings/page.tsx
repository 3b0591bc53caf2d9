import "@/features/practices/practices.css";
import { getDiarySettings, getFindingWeights } from "@withy/services/diary";
import { getPracticeSettings, listApiKeys, listStaff } from "@withy/services/practices";
import { ButtonLink } from "@withy/ui/button";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import Link from "next/link";
import { ApiKeys } from "@/features/practices/components/api-keys";
import { FindingWeights } from "@/features/practices/components/finding-weights";
import { PracticeSettings } from "@/features/practices/components/practice-settings";
import { ReminderSettings } from "@/features/practices/components/reminder-settings";
import { StaffList } from "@/features/practices/components/staff-list";
import { requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Settings" };

export default async function SettingsPage() {
  const ctx = await requireContext("practice.manage");
  const [settings, staff, diary, keys, weights] = await Promise.all([
    getPracticeSettings(ctx, {}),
    listStaff(ctx, {}),
    getDiarySettings(ctx, {}),
    listApiKeys(ctx, {}),
    getFindingWeights(ctx, {}),
  ]);
  return (
    <Page>
      <PageTitle
        title="Settings"
        lead={`${settings.legalName}. ${settings.vatNumber ? `VAT ${settings.vatNumber}` : "Not registered for VAT"}. Late with less than ${settings.noticeHours} hours' notice`}
        actions={
          <ButtonLink size="small" href="/settings/audit" as={Link}>
            Who did what
          </ButtonLink>
        }
      />
      <PageBody className="stacked settingspage">
        <StaffList
          first={staff}
          sites={settings.sites.map(({ id, name }) => ({ id, name }))}
          zone={ctx.zone}
          selfId={ctx.staffMemberId}
        />
        <ReminderSettings first={diary} zone={ctx.zone} />
        <FindingWeights first={weights} zone={ctx.zone} />
        <PracticeSettings settings={settings} />
        <ApiKeys first={keys} zone={ctx.zone} />
      </PageBody>
    </Page>
  );
}
