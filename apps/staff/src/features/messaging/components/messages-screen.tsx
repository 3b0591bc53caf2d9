"use client";
import { messageStateWords, messageTemplateWords } from "@withy/contracts/message-words";
import type { ListMessagesInput, MessageCounts, MessageRow } from "@withy/contracts/messaging";
import type { Page as PageOf } from "@withy/contracts/page";
import { shortDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/wall-clock";
import { AlertLine } from "@withy/ui/alert-line";
import { ChoiceLinks } from "@withy/ui/choice";
import { DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useMessages } from "../hooks/use-messages";
import { SendAgain } from "./send-again";

type State = NonNullable<ListMessagesInput["state"]>;

interface MessagesScreenProps {
  state: State;
  first: PageOf<MessageRow>;
  counts: MessageCounts;
  zone: string;
}

const choices: readonly { value: State; label: string }[] = [
  { value: "all", label: "All" },
  { value: "waiting", label: "Waiting" },
  { value: "sent", label: "Sent" },
  { value: "failed", label: "Not sent" },
];

function momentOf(iso: string, zone: string): string {
  const at = new Date(iso);
  return `${shortDate(dayOf(at, zone), dayOf(new Date(), zone))}, ${timeOf(at, zone)}`;
}

/** What went out, what waits and what did not go, and a way to send it once more. */
export function MessagesScreen({ state, first, counts, zone }: MessagesScreenProps) {
  const router = useRouter();
  const { rows, page, pageSize, total } = useMessages({ state, page: first.page }, first).data;
  const items = choices.map(({ value, label }) => ({
    href: `/messages?state=${value}`,
    label,
    current: value === state,
  }));
  return (
    <Page>
      <PageTitle
        title="Messages sent"
        actions={<ChoiceLinks label="Which messages" items={items} as={Link} />}
      />
      <PageBody>
        {counts.failed > 0 && state !== "failed" && (
          <AlertLine>
            <Link href="/messages?state=failed">
              {counts.failed === 1 ? "One message was not sent" : `${counts.failed} messages were not sent`}
            </Link>
            . Look why, then send again.
          </AlertLine>
        )}
        <DataTable
          caption="Messages, newest first"
          rows={rows}
          rowId={(row) => row.id}
          columns={columns(zone)}
          page={{ index: page - 1, size: pageSize, total }}
          onPageChange={(index) => router.push(`/messages?state=${state}&page=${index + 1}`)}
          empty={
            <EmptyState title="No messages here">
              Confirmations of appointments and links to letters appear here as they are written.
            </EmptyState>
          }
        />
      </PageBody>
    </Page>
  );
}

const columns = (zone: string) => [
  {
    id: "when",
    header: "When",
    cell: (row: MessageRow) => (
      <span className="num nowrap">{momentOf(row.sentAt ?? row.createdAt, zone)}</span>
    ),
  },
  {
    id: "what",
    header: "What",
    rowHeader: true,
    cell: (row: MessageRow) => messageTemplateWords[row.template],
  },
  {
    id: "patient",
    header: "About",
    cell: (row: MessageRow) =>
      row.patientId === null ? (
        <span className="soft">an account</span>
      ) : (
        <Link href={`/patients/${row.patientId}`}>{row.patientName}</Link>
      ),
  },
  { id: "to", header: "To", cell: (row: MessageRow) => <span className="message-to">{row.toAddress}</span> },
  {
    id: "state",
    header: "State",
    cell: (row: MessageRow) => (
      <>
        <span className={row.state === "failed" ? "danger" : undefined}>{messageStateWords[row.state]}</span>
        {row.problem && <span className="message-problem">{row.problem}</span>}
        {row.dueAt && row.attempts > 0 && (
          <span className="message-problem">Next try {momentOf(row.dueAt, zone)}</span>
        )}
      </>
    ),
  },
  {
    id: "again",
    header: "Send again",
    cell: (row: MessageRow) => (row.canSendAgain ? <SendAgain row={row} zone={zone} /> : null),
  },
];
