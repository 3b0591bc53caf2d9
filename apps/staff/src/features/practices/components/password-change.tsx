"use client";
import { Button, Buttons } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useChanges } from "@withy/ui/recent-changes";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { useChangePassword } from "../hooks/use-change-password";
import { momentWords } from "../moment-words";

const empty = { currentPassword: "", password: "", again: "" };

/** A new password for oneself. */
export function PasswordChange({ zone }: { zone: string }) {
  const { announce } = useChanges();
  const { register, handleSubmit, reset } = useForm({ defaultValues: empty });
  const [differs, setDiffers] = useState(false);
  const change = useChangePassword();
  const isAwake = useAwake();
  const save = handleSubmit(({ currentPassword, password, again }) => {
    setDiffers(password !== again);
    if (password !== again) return;
    change.mutate(
      { currentPassword, password },
      {
        onSuccess: () => {
          reset(empty);
          const at = momentWords(new Date().toISOString(), zone).slice(-5);
          announce({ at, said: "You changed your password; your other browsers are signed out" });
        },
      },
    );
  });
  const differing = "The two new passwords differ. Type both again.";
  const errors = differs
    ? [{ id: "again", message: differing }]
    : change.error
      ? problemItems(change.error)
      : [];
  return (
    <section aria-labelledby="password-title">
      <SectionHead id="password-title" title="Your password" />
      <form noValidate className="narrowform" onSubmit={save}>
        <ErrorSummary title="The password is not changed yet" errors={errors} attempt={change.submittedAt} />
        <TextInput
          id="currentPassword"
          label="Password you sign in with now"
          type="password"
          autoComplete="current-password"
          error={fieldProblem(change.error, "currentPassword")}
          {...register("currentPassword")}
        />
        <TextInput
          id="password"
          label="New password"
          hint="At least 12 characters. Three or four words you can remember work well."
          type="password"
          autoComplete="new-password"
          error={fieldProblem(change.error, "password")}
          {...register("password")}
        />
        <TextInput
          id="again"
          label="The same password again"
          type="password"
          autoComplete="new-password"
          error={differs ? differing : undefined}
          {...register("again")}
        />
        <Buttons>
          <Button kind="primary" type="submit" disabled={!isAwake} busy={change.isPending}>
            Change password
          </Button>
        </Buttons>
      </form>
    </section>
  );
}
