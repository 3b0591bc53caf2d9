import { hash, verify } from "@node-rs/argon2";

// OWASP's argon2id floor: 19 MiB, two passes, one lane.
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Checked where there is no such account, so that an unknown address takes as long as a wrong password. */
const nobody =
  "$argon2id$v=19$m=19456,t=2,p=1$SOkG1C3Khk+otQDRtw0cqw$QEYxQmHE5sHYYy/BgLeND8R2nmbNY9VsAGgDGj6REb4";

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize("NFKC"), cost);
}

export async function matchesPassword(stored: string | null, password: string): Promise<boolean> {
  const isRight = await verify(stored ?? nobody, password.normalize("NFKC")).catch(() => false);
  return isRight && stored !== null;
}
