import type { ErrorSummaryItem } from "./problem-items";
import { ApiError } from "./request";

/**
 * A failed save as the error summary shows it: each field's sentence, linked to the field with that id, or the one
 * sentence of the refusal.
 */
export function problemItems(
  error: unknown,
  fieldId: (field: string) => string = (field) => field,
): ErrorSummaryItem[] {
  if (!(error instanceof ApiError))
    return [{ message: "Something went wrong in this page. Reload it and try again." }];
  const { fields, detail } = error.problem;
  return fields.length === 0
    ? [{ message: detail }]
    : fields.map((f) => ({ id: fieldId(f.field), message: f.message }));
}

/** The sentence for one field, where the failed save had one. */
export function fieldProblem(error: unknown, field: string): string | undefined {
  return error instanceof ApiError ? error.problem.fields.find((f) => f.field === field)?.message : undefined;
}
