"use client";
import type { DuplicateCandidate } from "@withy/contracts/patients";
import { ErrorSummary } from "@withy/ui/error-summary";
import { problemItems } from "@/api/form-problems";
import { ApiError } from "@/api/request";
import { fieldId } from "../patient-form";
import { DuplicateNotice } from "./duplicate-notice";

interface Props {
  error: unknown;
  attempt: number;
  isSaving: boolean;
  onSomeoneElse: () => void;
}

/** Why the patient is not saved yet, at the top of the form. */
export function SaveProblem({ error, attempt, isSaving, onSomeoneElse }: Props) {
  if (error === null) return null;
  if (error instanceof ApiError && error.problem.kind === "possible-duplicate") {
    const candidates = (error.problem.more["candidates"] ?? []) as DuplicateCandidate[];
    return (
      <DuplicateNotice
        message={error.problem.detail}
        candidates={candidates}
        attempt={attempt}
        isSaving={isSaving}
        onSomeoneElse={onSomeoneElse}
      />
    );
  }
  return (
    <ErrorSummary
      title="The patient is not saved yet"
      errors={problemItems(error, fieldId)}
      attempt={attempt}
    />
  );
}
