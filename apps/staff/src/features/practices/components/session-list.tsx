"use client";
import type { SessionRow } from "@withy/contracts/practices";
import { Button, Buttons } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { SectionHead } from "@withy/ui/section-head";
import { useLeaving } from "@/components/leaving";
import { useEndAllSessions, useEndSession, useSessions } from "../hooks/use-sessions";
import { momentWords } from "../moment-words";

interface Props {
  first: SessionRow[];
  zone: string;
}

/** Where one is signed in, and the ways to end it. */
export function SessionList({ first, zone }: Props) {
  const { data } = useSessions(first);
  const end = useEndSession();
  const endAll = useEndAllSessions();
  const columns: readonly DataColumn<SessionRow>[] = [
    {
      id: "browser",
      header: "Browser",
      rowHeader: true,
      cell: (row) => (row.isThisOne ? `${row.browser}, this one` : row.browser),
    },
    { id: "desk", header: "Desk", cell: (row) => row.deskSiteName },
    { id: "opened", header: "Signed in", cell: (row) => momentWords(row.openedAt, zone) },
    { id: "seen", header: "Last used", cell: (row) => momentWords(row.lastSeenAt, zone) },
    {
      id: "end",
      header: "End",
      cell: (row) =>
        !row.isThisOne && (
          <Button kind="plain" size="small" busy={end.isPending} onClick={() => end.mutate(row.id)}>
            Sign out<span className="vh"> of {row.browser}</span>
          </Button>
        ),
    },
  ];
  const { leave, question } = useLeaving(() =>
    endAll.mutate(undefined, { onSuccess: () => window.location.assign("/sign-in?left=1") }),
  );
  const problem = end.error ?? endAll.error;
  return (
    <section aria-labelledby="sessions-title">
      <SectionHead
        id="sessions-title"
        title="Where you are signed in"
        aside="a session ends after two hours without use"
      />
      {problem && (
        <p className="danger" role="alert">
          {problem.message}
        </p>
      )}
      <DataTable caption="Your sessions" columns={columns} rows={data} rowId={(row) => row.id} />
      <Buttons>
        <Button kind="stop" busy={endAll.isPending} onClick={leave}>
          Sign out everywhere
        </Button>
      </Buttons>
      {question}
    </section>
  );
}
