// @vitest-environment node
import { AppError, notFound } from "@withy/core/errors";
import { beforeEach, expect, it, vi } from "vitest";

vi.mock("server-only", () => ({}));
const openLinkedLetter = vi.hoisted(() => vi.fn());
vi.mock("@withy/services/letters", () => ({ openLinkedLetter }));
vi.mock("@/server/session", () => ({ systemContext: () => ({}) }));
vi.mock("@/server/log", () => ({ log: { error: vi.fn() } }));

const { POST } = await import("./route");

const host = "withy.example";
const token = "A".repeat(43);

function post(
  fields: Record<string, string>,
  headers: Record<string, string> = { origin: `http://${host}` },
) {
  const request = new Request(`http://${host}/link/${token}/letter/pdf`, {
    method: "POST",
    body: new URLSearchParams(fields),
    headers: { host, ...headers },
  });
  return POST(request, { params: Promise.resolve({ token }) });
}

beforeEach(() => {
  openLinkedLetter.mockReset();
  openLinkedLetter.mockResolvedValue({ bytes: Buffer.from("%PDF-"), filename: "letter-L-7KX2QD.pdf" });
});

it("gives the letter for the date in the form, and no cache may keep it", async () => {
  const answer = await post({ bornOn: "22 6 1954" });
  expect(openLinkedLetter).toHaveBeenCalledExactlyOnceWith({}, { token, bornOn: "22 6 1954" });
  expect(answer.status).toBe(200);
  expect(answer.headers.get("content-type")).toBe("application/pdf");
  expect(answer.headers.get("cache-control")).toBe("private, no-store");
});

it.each([
  ["a wrong date", new AppError("refused", "Another day.", { kind: "wrong-date" })],
  ["too many tries", new AppError("refused", "Wait.", { kind: "too-many-tries" })],
  ["no date", new AppError("invalid", "Enter a date.")],
  ["a link that has run out", notFound("letter")],
])("leads %s back to the page, the date not in the address", async (_, error) => {
  openLinkedLetter.mockRejectedValue(error);
  const answer = await post({ bornOn: "23 6 1954" });
  expect(answer.status).toBe(303);
  expect(answer.headers.get("location")).toBe(`/link/${token}/letter`);
  expect(await answer.text()).toBe("");
});

it("asks the service without a date where the form had none", async () => {
  await post({});
  expect(openLinkedLetter).toHaveBeenCalledWith({}, { token, bornOn: "" });
});

it("opens nothing for a form on another site", async () => {
  const answer = await post({ bornOn: "22 6 1954" }, { origin: "http://elsewhere.example" });
  expect(answer.status).toBe(403);
  expect(openLinkedLetter).not.toHaveBeenCalled();
});
