import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { AppError } from "@withy/core/errors";
import type { z } from "zod";
import type { Context } from "./context";

/** One thing that can be done: always asked for its permission, always given checked input. */
export interface Verb<I extends z.ZodType = z.ZodType, O = unknown> {
  (ctx: Context, input: z.input<I>): Promise<O>;
  readonly permission: Permission;
  readonly input: I;
}

/**
 * Makes a verb. It refuses whoever holds the permission nowhere, then parses; the work behind it starts with
 * both done. Reach to one site's row is asked for in the work, once the row is loaded (`requireReach`).
 */
export function verb<I extends z.ZodType, O>(
  permission: Permission,
  input: I,
  work: (ctx: Context, input: z.output<I>) => Promise<O>,
): Verb<I, O> {
  const run = async (ctx: Context, raw: z.input<I>): Promise<O> => {
    authorize(ctx, permission);
    return work(ctx, parse(input, raw));
  };
  return Object.assign(run, { permission, input });
}

export function authorize(ctx: Context, permission: Permission): void {
  if (!can(ctx.roles, permission)) {
    throw new AppError("forbidden", "Your role does not allow this. Ask the practice owner if you need it.");
  }
}

/** Checked input, or an "invalid" error with one sentence for each field. */
export function parse<I extends z.ZodType>(schema: I, raw: unknown): z.output<I> {
  const result = schema.safeParse(raw);
  if (result.success) return result.data;
  const fields = result.error.issues.map((issue) => ({
    field: issue.path.join("."),
    message: issue.message,
  }));
  throw new AppError("invalid", "Some answers need another look.", { fields });
}
