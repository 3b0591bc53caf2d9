import { apiKeys } from "@withy/db/schema";
import { openByKey } from "@withy/services/diary/fhir/index";
import { listApiKeys, makeApiKey, revokeApiKey } from "@withy/services/practices";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor, systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});
const owner = () => contextFor(practice, "owner");
const open = (header: string | null) => openByKey(systemContextFor(practice), header);

describe("a key for another program", () => {
  it("is shown once, kept as a hash alone, and opens its own practice", async () => {
    const { secret, keys } = await makeApiKey(owner(), { name: "Door screen" });
    expect(secret).toMatch(/^withy_[A-Za-z0-9_-]{43}$/);
    expect(keys).toMatchObject([{ name: "Door screen", lastUsedOn: null, revokedAt: null }]);
    const rows = await practice.db.select().from(apiKeys).where(eq(apiKeys.practiceId, practice.practiceId));
    expect(JSON.stringify([rows, keys])).not.toContain(secret.slice(6));
    expect(await open(`Bearer ${secret}`)).toMatchObject({ practiceId: practice.practiceId });
    expect(await listApiKeys(owner(), {})).toMatchObject([{ lastUsedOn: "2026-12-01" }]);
  });

  it("is refused in the same words when missing, wrong or ended", async () => {
    const words = (header: string | null) =>
      open(header).then(
        () => "open",
        (error: Error & { code?: string }) => `${error.code}: ${error.message}`,
      );
    const none = await words(null);
    expect(none).toMatch(/^unauthenticated: /);
    for (const header of ["", "Bearer", "Basic abc", "Bearer withy_short", `Bearer withy_${"A".repeat(43)}`])
      expect(await words(header), header).toBe(none);
    const { secret, keys } = await makeApiKey(owner(), { name: "Door screen" });
    expect(await words(`Bearer ${secret}`)).toBe("open");
    await revokeApiKey(owner(), { apiKeyId: keys[0]?.id ?? "" });
    expect(await words(`Bearer ${secret}`)).toBe(none);
  });

  it("is written down when made, used for the first time in a day, and ended", async () => {
    const { secret, keys } = await makeApiKey(owner(), { name: "Door screen" });
    const id = keys[0]?.id ?? "";
    await Promise.all([open(`Bearer ${secret}`), open(`Bearer ${secret}`)]);
    practice.clock.set("2026-12-02T09:00:00Z");
    await open(`Bearer ${secret}`);
    await revokeApiKey(owner(), { apiKeyId: id });
    await expect(revokeApiKey(owner(), { apiKeyId: id })).rejects.toMatchObject({ code: "not-found" });
    expect((await auditOf(practice, id)).map((event) => event.action)).toEqual([
      "api-key.made",
      "api-key.used",
      "api-key.used",
      "api-key.revoked",
    ]);
  });

  it("is one of twenty at most, however many are made at once", async () => {
    const made = await Promise.allSettled(
      Array.from({ length: 23 }, (_, n) => makeApiKey(owner(), { name: `Key ${n}` })),
    );
    expect(made.filter((one) => one.status === "fulfilled")).toHaveLength(20);
    await expect(makeApiKey(owner(), { name: "One more" })).rejects.toMatchObject({ kind: "too-many-keys" });
  });
});
