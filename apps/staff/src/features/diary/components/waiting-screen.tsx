"use client";
import type { BookingChoicesView, FreedTimeRow, OfferRoundView, WaitingRow } from "@withy/contracts/diary";
import type { Page as PageOf } from "@withy/contracts/page";
import { urgencies, urgencyWords } from "@withy/diary/waiting-words";
import { Button } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import type { ComboboxOption } from "@withy/ui/combobox";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useWaiting } from "../hooks/use-waiting";
import { waitingHref } from "../waiting-address";
import type { WaitingFilters } from "../waiting-client";
import { FreedTimes } from "./freed-times";
import { OfferRounds } from "./offer-rounds";
import { WaitingTable } from "./waiting-table";

const WaitingDialog = dynamic(() => import("./waiting-dialog").then((m) => m.WaitingDialog));
const WithdrawDialog = dynamic(() => import("./withdraw-dialog").then((m) => m.WithdrawDialog));

export interface WaitingScreenProps {
  filters: WaitingFilters;
  first: PageOf<WaitingRow>;
  rounds: readonly OfferRoundView[];
  freed: readonly FreedTimeRow[];
  sites: readonly { id: string; name: string }[];
  /** Null for those who may look and not book. */
  choices: BookingChoicesView | null;
  /** The form is open from the start, with what the address brought along. */
  start: { patient: ComboboxOption | null; serviceId: string } | null;
  zone: string;
  today: string;
}

type Open = { form: "add" } | { form: "edit" | "withdraw"; row: WaitingRow } | null;

/** Who waits, what has come free, and what is on offer at this moment. */
export function WaitingScreen(props: WaitingScreenProps) {
  const { filters, first, choices, start, zone, today } = props;
  const page = useWaiting(filters, first).data;
  const [open, setOpen] = useState<Open>(start && choices ? { form: "add" } : null);
  useShortcut("add-waiting", () => setOpen({ form: "add" }), choices !== null);
  const close = () => setOpen(null);
  const actions = choices && (
    <Button kind="primary" size="small" shortcut="W" onClick={() => setOpen({ form: "add" })}>
      Add someone
    </Button>
  );
  return (
    <Page>
      <PageTitle title="Waiting list" lead={leadWords(page.total)} actions={actions} />
      <PageBody>
        <div className="waitcols">
          <OfferRounds first={props.rounds} mayStop={choices !== null} zone={zone} />
          <FreedTimes first={props.freed} mayOffer={choices !== null} />
        </div>
        <Filters filters={filters} sites={props.sites} />
        <WaitingTable
          page={page}
          filters={filters}
          onEdit={choices ? (row) => setOpen({ form: "edit", row }) : undefined}
          onWithdraw={choices ? (row) => setOpen({ form: "withdraw", row }) : undefined}
        />
      </PageBody>
      {open?.form === "withdraw" && <WithdrawDialog row={open.row} zone={zone} onClose={close} />}
      {choices && (open?.form === "add" || open?.form === "edit") && (
        <WaitingDialog
          row={open.form === "edit" ? open.row : null}
          start={start}
          choices={choices}
          zone={zone}
          today={today}
          onClose={close}
        />
      )}
    </Page>
  );
}

const leadWords = (total: number): string =>
  total === 0 ? "Nobody waits here." : total === 1 ? "One person waits." : `${total} people wait.`;

function Filters({
  filters,
  sites,
}: {
  filters: WaitingFilters;
  sites: readonly { id: string; name: string }[];
}) {
  const href = (part: Partial<WaitingFilters>) => waitingHref({ ...filters, page: 1, ...part });
  return (
    <div className="waitfilters">
      {sites.length > 1 && (
        <ChoiceLinks
          label="Where they would come"
          as={Link}
          items={[
            { href: href({ siteId: undefined }), label: "Any site", current: filters.siteId === undefined },
            ...sites.map(({ id, name }) => ({
              href: href({ siteId: id }),
              label: name,
              current: filters.siteId === id,
            })),
          ]}
        />
      )}
      <ChoiceLinks
        label="How urgent"
        as={Link}
        items={[
          { href: href({ urgency: undefined }), label: "All", current: filters.urgency === undefined },
          ...[...urgencies].reverse().map((one) => ({
            href: href({ urgency: one }),
            label: urgencyWords[one],
            current: filters.urgency === one,
          })),
        ]}
      />
    </div>
  );
}
