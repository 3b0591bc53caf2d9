import { z } from "zod";

const port = z.coerce.number().int().min(1).max(65_535);

const schema = z.object({
  WITHY_FAKES_PORT: port.default(3100),
  WITHY_SMTP_PORT: port.default(3125),
  WITHY_DATA_DIR: z.string().min(1).optional(),
});

export interface FakesEnv {
  readonly httpPort: number;
  readonly smtpPort: number;
  readonly dataDir: string | null;
}

export function readEnv(environment: NodeJS.ProcessEnv): FakesEnv {
  const result = schema.safeParse(environment);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The settings of the stand-ins are not right:\n${lines.join("\n")}`);
  }
  const env = result.data;
  return {
    httpPort: env.WITHY_FAKES_PORT,
    smtpPort: env.WITHY_SMTP_PORT,
    dataDir: env.WITHY_DATA_DIR ?? null,
  };
}
