import type { WaitingRow } from "@withy/contracts/diary";
import type { Page } from "@withy/contracts/page";
import { weekdayDate } from "@withy/core/date-words";
import { urgencyWords } from "@withy/diary/waiting-words";
import { Button } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { phoneWords } from "../phone-words";
import { waitingHref } from "../waiting-address";
import type { WaitingFilters } from "../waiting-client";

interface Props {
  page: Page<WaitingRow>;
  filters: WaitingFilters;
  onEdit: ((row: WaitingRow) => void) | undefined;
  onWithdraw: ((row: WaitingRow) => void) | undefined;
}

/** Who waits, most urgent first, then by how long. */
export function WaitingTable({ page, filters, onEdit, onWithdraw }: Props) {
  const router = useRouter();
  return (
    <DataTable
      caption="Waiting, most urgent first"
      rows={page.rows}
      rowId={(row) => row.id}
      columns={onEdit && onWithdraw ? [...columns, actionColumn(onEdit, onWithdraw)] : columns}
      page={{ index: page.page - 1, size: page.pageSize, total: page.total }}
      onPageChange={(index) => router.push(waitingHref({ ...filters, page: index + 1 }))}
      empty={
        <EmptyState title="Nobody waits here">
          When no time suits a caller, add them; a time that comes free is then offered to them.
        </EmptyState>
      }
    />
  );
}

const waitWords = (days: number): string =>
  days === 0 ? "since today" : days === 1 ? "1 day" : `${days} days`;

const columns: readonly DataColumn<WaitingRow>[] = [
  {
    id: "who",
    header: "Who",
    rowHeader: true,
    cell: (row) => (
      <>
        <Link href={`/patients/${row.patient.id}`}>{row.patient.name}</Link>
        {row.patient.phone && <span className="waitunder num">{phoneWords(row.patient.phone)}</span>}
      </>
    ),
  },
  {
    id: "urgency",
    header: "Urgency",
    cell: (row) => (
      <span className={row.urgency === "urgent" ? "danger" : undefined}>{urgencyWords[row.urgency]}</span>
    ),
  },
  {
    id: "waits",
    header: "Waits",
    cell: (row) => <span className="num nowrap">{waitWords(row.waitsDays)}</span>,
  },
  {
    id: "for",
    header: "For",
    cell: (row) => `${row.service.name}, ${row.service.durationMinutes} min`,
  },
  {
    id: "wishes",
    header: "Would come",
    cell: (row) => (
      <>
        {row.wishWords === "" ? "Any time" : row.wishWords}
        {row.deskNote && <em className="waitunder serif">{row.deskNote}</em>}
      </>
    ),
  },
  {
    id: "instead",
    header: "Instead of",
    cell: (row) =>
      row.insteadOf ? (
        <Link href={`/diary?${new URLSearchParams({ day: row.insteadOf.day, at: row.insteadOf.id })}`}>
          {weekdayDate(row.insteadOf.day)}, {row.insteadOf.startTime}
        </Link>
      ) : (
        <span className="soft">no visit yet</span>
      ),
  },
];

const actionColumn = (
  onEdit: (row: WaitingRow) => void,
  onWithdraw: (row: WaitingRow) => void,
): DataColumn<WaitingRow> => ({
  id: "actions",
  header: "Change",
  cell: (row) => (
    <span className="waitverbs">
      {row.openRoundId && <a href={`#round-${row.openRoundId}`}>on offer</a>}
      <Button kind="plain" size="small" aria-label={`Edit ${row.patient.name}`} onClick={() => onEdit(row)}>
        Edit
      </Button>
      <Button
        kind="plain"
        size="small"
        aria-label={`Take ${row.patient.name} off the list`}
        onClick={() => onWithdraw(row)}
      >
        Take off
      </Button>
    </span>
  ),
});
