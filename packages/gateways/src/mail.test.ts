import { describe, expect, it } from "vitest";
import { messageIdOf, readFailure } from "./mail";

describe("what a failed sending means", () => {
  it.each([
    [{ code: "EENVELOPE", command: "RCPT TO", responseCode: 550 }, "refused", "smtp-550"],
    [{ code: "EMESSAGE", command: "DATA", responseCode: 554 }, "refused", "smtp-554"],
    [{ code: "EENVELOPE", command: "API" }, "refused", "bad-address"],
    [{ code: "EENVELOPE", command: "RCPT TO", responseCode: 451 }, "try-later", "smtp-451"],
    [{ code: "EENVELOPE", command: "RCPT TO", responseCode: 452 }, "try-later", "smtp-452"],
    [{ code: "EENVELOPE", command: "RCPT TO", responseCode: 503 }, "try-later", "smtp-503"],
    [{ code: "EAUTH", command: "AUTH PLAIN", responseCode: 535 }, "try-later", "smtp-535"],
    [{ code: "EPROTOCOL", command: "CONN", responseCode: 554 }, "try-later", "smtp-554"],
    [{ code: "ESOCKET", command: "CONN" }, "try-later", "esocket"],
    [{ code: "ETIMEDOUT" }, "try-later", "etimedout"],
    ["not an error at all", "try-later", "unknown"],
  ])("%j is %s", (failure, outcome, reason) => {
    expect(readFailure(failure)).toEqual({ outcome, reason });
  });

  it("names a message after its outbox row, in the domain that it comes from", () => {
    expect(messageIdOf("0189-abc", "post@marram.example")).toBe("<0189-abc@marram.example>");
  });
});
