"use client";
import type { StaffRow } from "@withy/contracts/practices";
import { Button } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { SectionHead } from "@withy/ui/section-head";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useStaff } from "../hooks/use-staff";
import { momentWords } from "../moment-words";
import { heldWords } from "../role-words";
import { AccessButtons } from "./access-buttons";

const InviteDialog = dynamic(() => import("./invite-dialog").then((m) => m.InviteDialog), { ssr: false });
const RolesDialog = dynamic(() => import("./roles-dialog").then((m) => m.RolesDialog), { ssr: false });

interface Props {
  first: StaffRow[];
  sites: readonly { id: string; name: string }[];
  zone: string;
  /** The person who looks, whose own access cannot be ended here. */
  selfId: string;
}

/** Who works here, with what rights. */
export function StaffList({ first, sites, zone, selfId }: Props) {
  const { data } = useStaff(first);
  const [isInviting, setIsInviting] = useState(false);
  const [changing, setChanging] = useState<StaffRow | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const columns: readonly DataColumn<StaffRow>[] = [
    {
      id: "name",
      header: "Name",
      rowHeader: true,
      cell: (row) => (
        <>
          {row.name}
          <span className="soft">, {row.jobTitle}</span>
        </>
      ),
    },
    { id: "roles", header: "Roles", cell: (row) => heldWords(row.roles, sites) },
    {
      id: "email",
      header: "Signs in with",
      cell: (row) => <span className="staff-email">{row.email ?? "nothing yet"}</span>,
    },
    { id: "seen", header: "Last here", cell: (row) => seenWords(row, zone) },
    {
      id: "do",
      header: "Change",
      cell: (row) => (
        <span className="nowrap">
          {row.isActive && (
            <Button kind="plain" size="small" onClick={() => setChanging(row)}>
              Roles<span className="vh"> of {row.name}</span>
            </Button>
          )}
          <AccessButtons member={row} isSelf={row.id === selfId} zone={zone} onProblem={setProblem} />
        </span>
      ),
    },
  ];
  return (
    <section aria-labelledby="staff-title">
      <SectionHead
        id="staff-title"
        title="Staff and roles"
        aside={`${data.filter((row) => row.isActive).length} with access`}
        action={
          <Button kind="primary" size="small" onClick={() => setIsInviting(true)}>
            Invite a colleague
          </Button>
        }
      />
      {problem !== null && (
        <p className="danger" role="alert">
          {problem}
        </p>
      )}
      <DataTable caption="Staff" columns={columns} rows={data} rowId={(row) => row.id} />
      {isInviting && <InviteDialog sites={sites} zone={zone} onClose={() => setIsInviting(false)} />}
      {changing && (
        <RolesDialog member={changing} sites={sites} zone={zone} onClose={() => setChanging(null)} />
      )}
    </section>
  );
}

function seenWords(row: StaffRow, zone: string): string {
  if (!row.isActive) return "has left";
  if (!row.hasJoined) return "invited, not joined";
  return row.lastSeenAt === null ? "not yet" : momentWords(row.lastSeenAt, zone);
}
