// @vitest-environment node
import { AppError } from "@withy/core/errors";
import { beforeEach, expect, test, vi } from "vitest";

vi.mock("server-only", () => ({}));
const openByKey = vi.hoisted(() => vi.fn());
const logged = vi.hoisted(() => vi.fn());
vi.mock("./session", () => ({ systemContext: () => ({}) }));
vi.mock("./run-route", () => ({ describe: () => ({}) }));
vi.mock("./log", () => ({ log: { error: logged } }));
vi.mock("./env", () => ({ env: () => ({ NEXTAUTH_URL: "https://withy.example/" }) }));
vi.mock("@withy/services/diary/fhir/index", async (original) => ({
  ...(await original<typeof import("@withy/services/diary/fhir/index")>()),
  openByKey,
}));

const { answerFhir, fhirBase } = await import("./fhir-route");
const request = new Request("https://withy.example/api/fhir/r4/Appointment", {
  headers: { authorization: "Bearer abc" },
});

beforeEach(() => {
  openByKey.mockReset().mockResolvedValue({});
  logged.mockReset();
});

test("answers as FHIR's JSON, under the app's own address", async () => {
  const answer = await answerFhir(request, async () => ({ resourceType: "Bundle" }));
  expect(answer.status).toBe(200);
  expect(answer.headers.get("content-type")).toBe("application/fhir+json; charset=utf-8");
  expect(openByKey).toHaveBeenCalledWith({}, "Bearer abc");
  expect(fhirBase()).toBe("https://withy.example/api/fhir/r4");
});

test.each([
  [new AppError("unauthenticated", "A key."), 401, "login"],
  [new AppError("invalid", "A date."), 400, "invalid"],
  [new AppError("invalid", "Not here.", { kind: "not-supported" }), 400, "not-supported"],
  [new AppError("not-found", "None."), 404, "not-found"],
  [new AppError("refused", "Wait.", { kind: "too-many-tries" }), 429, "throttled"],
])("tells %s with status %i as an OperationOutcome", async (error, status, code) => {
  const answer = await answerFhir(request, () => Promise.reject(error));
  expect(answer.status).toBe(status);
  expect(await answer.json()).toEqual({
    resourceType: "OperationOutcome",
    issue: [{ severity: "error", code, diagnostics: error.message }],
  });
  expect(answer.headers.get("www-authenticate")).toBe(status === 401 ? "Bearer" : null);
  expect(logged).not.toHaveBeenCalled();
});

test("a bug is told without its words, and logged", async () => {
  const answer = await answerFhir(request, () => Promise.reject(new Error("Perran Oake")));
  expect(answer.status).toBe(500);
  expect(await answer.text()).not.toContain("Perran");
  expect(logged).toHaveBeenCalledOnce();
});
