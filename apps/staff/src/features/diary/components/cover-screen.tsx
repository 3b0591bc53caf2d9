"use client";
import type { BookingChoicesView, CoverPlanRow, CoverPlanView } from "@withy/contracts/diary";
import { shortDate } from "@withy/core/date-words";
import { Line } from "@withy/ui/line";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { planStateWords } from "../cover-words";
import { CoverForm } from "./cover-form";
import { CoverPlan } from "./cover-plan";

export interface CoverScreenProps {
  choices: BookingChoicesView;
  plan: CoverPlanView | null;
  plans: readonly CoverPlanRow[];
  today: string;
}

/** A therapist is away or a room is shut: new places for everyone booked there. */
export function CoverScreen({ choices, plan, plans, today }: CoverScreenProps) {
  const router = useRouter();
  if (plan) return <CoverPlan key={plan.id} first={plan} />;
  return (
    <Page className="coverpage">
      <PageTitle
        title="Arrange cover"
        lead="Everyone booked in that time gets another place, with the least change for all together. You look it over before anything moves."
      />
      <PageBody>
        <CoverForm
          choices={choices}
          today={today}
          onPlanned={({ id }) => router.push(`/diary/cover?plan=${id}`)}
        />
      </PageBody>
      {plans.length > 0 && (
        <section aria-labelledby="plans-title">
          <div className="body">
            <SectionHead id="plans-title" title="Latest plans" />
          </div>
          {plans.map((row) => (
            <Line key={row.id} gutter={shortDate(row.startDay, today)} tick className="coverline">
              <Link href={`/diary/cover?plan=${row.id}`}>{row.causeName}</Link>
              <span className="soft">{row.reason}</span>
              <span>{planStateWords[row.state]}</span>
            </Line>
          ))}
        </section>
      )}
    </Page>
  );
}
