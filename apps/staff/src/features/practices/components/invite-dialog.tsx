"use client";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { FieldRow } from "@withy/ui/field-group";
import { useChanges } from "@withy/ui/recent-changes";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useInvite } from "../hooks/use-staff";
import { momentWords } from "../moment-words";
import type { Held } from "../role-words";
import { RoleFields } from "./role-fields";

interface Props {
  sites: readonly { id: string; name: string }[];
  zone: string;
  onClose: () => void;
}

/** Invites a colleague: name, address, what they work as, and their roles. */
export function InviteDialog({ sites, zone, onClose }: Props) {
  const { announce } = useChanges();
  const [roles, setRoles] = useState<Held[]>([]);
  const { register, handleSubmit } = useForm({
    defaultValues: {
      givenName: "",
      familyName: "",
      email: "",
      jobTitle: "",
      registrationNumber: "",
      homeSiteId: sites[0]?.id ?? "",
    },
  });
  const invite = useInvite();
  const save = handleSubmit((typed) =>
    invite.mutate(
      { ...typed, roles },
      {
        onSuccess: () => {
          const at = momentWords(new Date().toISOString(), zone).slice(-5);
          announce({ at, said: `You invited ${typed.givenName} ${typed.familyName}` });
          onClose();
        },
      },
    ),
  );
  const problem = (field: string) => fieldProblem(invite.error, field);
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Invite a colleague"
      lead="They get a link by e-mail to choose a password. It works once, for seven days."
      size="wide"
      actions={
        <Button kind="primary" busy={invite.isPending} onClick={save}>
          Send the invitation
        </Button>
      }
    >
      {invite.error && (
        <ErrorSummary
          title="The invitation is not sent yet"
          errors={problemItems(invite.error, (field) => field.split(".")[0] ?? field)}
          attempt={invite.submittedAt}
        />
      )}
      <FieldRow>
        <TextInput
          id="givenName"
          label="Given name"
          error={problem("givenName")}
          {...register("givenName")}
        />
        <TextInput
          id="familyName"
          label="Family name"
          error={problem("familyName")}
          {...register("familyName")}
        />
      </FieldRow>
      <FieldRow>
        <TextInput
          id="email"
          type="email"
          label="E-mail address"
          error={problem("email")}
          {...register("email")}
        />
        <TextInput id="jobTitle" label="Works as" error={problem("jobTitle")} {...register("jobTitle")} />
      </FieldRow>
      <FieldRow>
        <TextInput
          id="registrationNumber"
          label="HCPC number"
          hint="Therapists only, such as PH123456"
          error={problem("registrationNumber")}
          {...register("registrationNumber")}
        />
        <Select
          id="homeSiteId"
          label="Home site"
          hint="Where their screens start"
          options={sites.map((s) => ({ value: s.id, label: s.name }))}
          error={problem("homeSiteId")}
          {...register("homeSiteId")}
        />
      </FieldRow>
      <RoleFields id="roles" value={roles} onChange={setRoles} sites={sites} error={problem("roles")} />
    </Dialog>
  );
}
