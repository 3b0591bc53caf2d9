import "server-only";
import { z } from "zod";

const port = z.coerce.number().int().min(1).max(65_535);

const schema = z
  .object({
    NODE_ENV: z.enum(["development", "production", "test"]),
    DATABASE_URL: z.url(),
    WITHY_SECRET: z.string().min(32, "Set WITHY_SECRET to at least 32 random characters."),
    NEXTAUTH_URL: z.url(),
    WITHY_PORT: port,
    WITHY_FAKES_PORT: port.optional(),
    WITHY_CARD_KEY: z.string().min(1),
    WITHY_CARD_WEBHOOK_SECRET: z.string().min(1),
    WITHY_CARD_HOST: z.string().optional(),
    WITHY_CARD_PORT: port.optional(),
    WITHY_DEMO: z.enum(["0", "1"]).default("0"),
    WITHY_LOG_LEVEL: z.enum(["debug", "info", "warn", "error", "silent"]).default("info"),
  })
  .refine((env) => env.WITHY_DEMO === "1" || !/demo|change-me|example/i.test(env.WITHY_SECRET), {
    path: ["WITHY_SECRET"],
    message: "This is the demonstration secret. Set a random one of your own for real use.",
  })
  .refine((env) => env.WITHY_DEMO === "1" || env.WITHY_CARD_HOST === undefined, {
    path: ["WITHY_CARD_HOST"],
    message: "Real use must talk to the real card service. Remove WITHY_CARD_HOST.",
  });

export type Env = z.infer<typeof schema>;

let known: Env | undefined;

/** The checked environment. @throws with one line for each setting that is missing or wrong */
export function env(): Env {
  if (known) return known;
  const result = schema.safeParse(process.env);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The settings are not complete:\n${lines.join("\n")}`);
  }
  known = result.data;
  return known;
}
