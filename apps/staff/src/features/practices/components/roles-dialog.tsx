"use client";
import type { StaffRow } from "@withy/contracts/practices";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useChangeRoles } from "../hooks/use-staff";
import { momentWords } from "../moment-words";
import type { Held } from "../role-words";
import { RoleFields } from "./role-fields";

interface Props {
  member: StaffRow;
  sites: readonly { id: string; name: string }[];
  zone: string;
  onClose: () => void;
}

/** Gives a colleague other roles, from their next click on. */
export function RolesDialog({ member, sites, zone, onClose }: Props) {
  const { announce } = useChanges();
  const [roles, setRoles] = useState<Held[]>([...member.roles]);
  const change = useChangeRoles();
  const save = () =>
    change.mutate(
      { staffMemberId: member.id, roles },
      {
        onSuccess: () => {
          const at = momentWords(new Date().toISOString(), zone).slice(-5);
          announce({ at, said: `You changed the roles of ${member.name}` });
          onClose();
        },
      },
    );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Roles of ${member.name}`}
      size="wide"
      actions={
        <Button kind="primary" busy={change.isPending} onClick={save}>
          Save roles
        </Button>
      }
    >
      {change.error && <ErrorSummary errors={problemItems(change.error)} attempt={change.submittedAt} />}
      <RoleFields
        id="roles"
        value={roles}
        onChange={setRoles}
        sites={sites}
        error={fieldProblem(change.error, "roles")}
      />
    </Dialog>
  );
}
