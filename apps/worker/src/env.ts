import { z } from "zod";

const port = z.coerce.number().int().min(1).max(65_535);

const schema = z
  .object({
    DATABASE_URL: z.url(),
    NEXTAUTH_URL: z.url(),
    WITHY_SMTP_HOST: z.string().min(1).default("127.0.0.1"),
    WITHY_SMTP_PORT: port.default(3125),
    WITHY_SMTP_ENCRYPTION: z.enum(["none", "starttls", "tls"]).optional(),
    WITHY_SMTP_USER: z.string().min(1).optional(),
    WITHY_SMTP_PASSWORD: z.string().min(1).optional(),
    /** "Name <address>" or the address alone; the practice's own name is shown instead of this one. */
    WITHY_MAIL_FROM: z.string().default("Withy <post@withy.example>"),
    WITHY_LOG_LEVEL: z.enum(["debug", "info", "warn", "error", "silent"]).default("info"),
  })
  .transform((env) => ({
    databaseUrl: env.DATABASE_URL,
    appUrl: env.NEXTAUTH_URL,
    fromAddress: /<([^<>\s]+@[^<>\s]+)>\s*$/.exec(env.WITHY_MAIL_FROM)?.[1] ?? env.WITHY_MAIL_FROM.trim(),
    logLevel: env.WITHY_LOG_LEVEL,
    smtp: {
      host: env.WITHY_SMTP_HOST,
      port: env.WITHY_SMTP_PORT,
      // Mail in the clear never leaves this machine.
      encryption: env.WITHY_SMTP_ENCRYPTION ?? (isLoopback(env.WITHY_SMTP_HOST) ? "none" : "starttls"),
      ...(env.WITHY_SMTP_USER === undefined ? {} : { user: env.WITHY_SMTP_USER }),
      ...(env.WITHY_SMTP_PASSWORD === undefined ? {} : { password: env.WITHY_SMTP_PASSWORD }),
    },
  }))
  .refine((env) => env.smtp.encryption !== "none" || isLoopback(env.smtp.host), {
    path: ["WITHY_SMTP_ENCRYPTION"],
    message: "Mail to another machine must be encrypted. Set starttls or tls.",
  })
  .refine((env) => /^[^\s<>]+@[^\s<>]+$/.test(env.fromAddress), {
    path: ["WITHY_MAIL_FROM"],
    message: "Give an address, such as Withy <post@practice.example>.",
  });

function isLoopback(host: string): boolean {
  return host === "localhost" || host === "::1" || host.startsWith("127.");
}

export type WorkerEnv = z.infer<typeof schema>;

/** The checked settings. @throws with one line for each that is missing or wrong */
export function readEnv(environment: NodeJS.ProcessEnv): WorkerEnv {
  const result = schema.safeParse(environment);
  if (result.success) return result.data;
  const lines = result.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`The worker's settings are not complete:\n${lines.join("\n")}`);
}
