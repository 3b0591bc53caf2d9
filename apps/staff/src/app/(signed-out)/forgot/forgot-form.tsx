"use client";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useActionState } from "react";
import { forget } from "@/server/account-actions";

export function ForgotForm() {
  const [state, act, isBusy] = useActionState(forget, { email: "", problem: null });
  return (
    <form action={act} noValidate>
      {state.problem !== null && <ErrorSummary errors={[{ id: "email", message: state.problem }]} />}
      <TextInput
        id="email"
        name="email"
        type="email"
        label="E-mail address"
        autoComplete="username"
        defaultValue={state.email}
        error={state.problem ?? undefined}
        autoFocus
      />
      <Button kind="primary" size="wide" type="submit" busy={isBusy}>
        Send the link
      </Button>
    </form>
  );
}
