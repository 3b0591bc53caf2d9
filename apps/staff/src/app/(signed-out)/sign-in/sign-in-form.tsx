"use client";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useActionState } from "react";
import { enter } from "@/server/actions";

export function SignInForm({ from }: { from: string }) {
  const [state, act, isBusy] = useActionState(enter, { email: "", problem: null });
  return (
    <form action={act} noValidate>
      {state.problem !== null && (
        <ErrorSummary errors={[{ id: "email", message: state.problem }]} title="You are not signed in yet" />
      )}
      <input type="hidden" name="from" value={from} />
      <TextInput
        id="email"
        name="email"
        type="email"
        label="E-mail address"
        autoComplete="username"
        defaultValue={state.email}
        span="full"
        autoFocus
      />
      <TextInput
        id="password"
        name="password"
        type="password"
        label="Password"
        autoComplete="current-password"
        span="full"
      />
      <Button kind="primary" size="wide" type="submit" busy={isBusy}>
        Sign in
      </Button>
    </form>
  );
}
