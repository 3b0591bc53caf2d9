import { changePassword } from "@withy/services/practices";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { demoPassword } from "../../../scripts/settings.mjs";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
beforeEach(() => practice.clock.advance(60));

const change = (person: TestPerson, currentPassword: string, password = "willow basket nine") =>
  changePassword(contextFor(practice, person), { currentPassword, password });

describe("guessing at one's own password", () => {
  it("waits after ten tries, for the right one too, and works again when the time is over", async () => {
    for (let i = 0; i < 10; i += 1) {
      await expect(change("therapist", "guess")).rejects.toMatchObject({ kind: "wrong-password" });
      practice.clock.advance(1);
    }
    await expect(change("therapist", demoPassword)).rejects.toMatchObject({
      kind: "too-many-tries",
      message: "Too many tries. Wait 14 minutes, then type it again.",
    });
    await expect(change("accounts", "guess"), "a colleague").rejects.toMatchObject({
      kind: "wrong-password",
    });
    practice.clock.advance(14);
    await change("therapist", demoPassword);
  });

  it("counts guesses that are sent at once", async () => {
    const guess = () => change("owner", "guess").catch((error) => error.kind);
    const answers = await Promise.all(Array.from({ length: 16 }, guess));
    expect(answers.filter((kind) => kind === "wrong-password")).toHaveLength(10);
    expect(answers.filter((kind) => kind === "too-many-tries")).toHaveLength(6);
  });

  it("forgets the wrong ones after a right one, and those that are long ago", async () => {
    for (let i = 0; i < 9; i += 1) await change("accounts", "guess").catch(() => undefined);
    await change("accounts", demoPassword);
    for (let i = 0; i < 9; i += 1) await change("accounts", "guess").catch(() => undefined);
    practice.clock.advance(15);
    for (let i = 0; i < 9; i += 1) await change("accounts", "guess").catch(() => undefined);
    await change("accounts", "willow basket nine", "nine willow baskets");
  });
});
