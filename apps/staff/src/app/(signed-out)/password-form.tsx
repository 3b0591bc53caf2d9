"use client";
import type { AccountLinkPurpose } from "@withy/contracts/practices";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useActionState } from "react";
import { choosePassword } from "@/server/account-actions";

interface Props {
  token: string;
  purpose: AccountLinkPurpose;
  /** So that a password keeper files the new password under the right name. */
  email: string;
}

/** A password, twice, behind a link from an e-mail. */
export function PasswordForm({ token, purpose, email }: Props) {
  const [state, act, isBusy] = useActionState(choosePassword, { problem: null, isLinkEnded: false });
  const problem = state.problem ?? undefined;
  return (
    <form action={act} noValidate>
      {problem !== undefined && (
        <ErrorSummary
          title="The password is not set yet"
          errors={[state.isLinkEnded ? { message: problem } : { id: "password", message: problem }]}
        />
      )}
      <input type="hidden" name="token" value={token} />
      <input type="hidden" name="purpose" value={purpose} />
      <input type="hidden" name="username" value={email} autoComplete="username" />
      <TextInput
        id="password"
        name="password"
        type="password"
        label="New password"
        hint="At least 12 characters. Three or four words you can remember work well."
        autoComplete="new-password"
        error={state.isLinkEnded ? undefined : problem}
        autoFocus
      />
      <TextInput
        id="again"
        name="again"
        type="password"
        label="The same password again"
        autoComplete="new-password"
      />
      <Button kind="primary" size="wide" type="submit" busy={isBusy}>
        Set the password
      </Button>
    </form>
  );
}
