import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, it, vi } from "vitest";
import type { ReaderState } from "@/server/letter-actions";
import { LetterReaderForm } from "./letter-reader-form";

const askReader = vi.hoisted(() => vi.fn<(before: ReaderState, form: FormData) => Promise<ReaderState>>());
vi.mock("@/server/letter-actions", () => ({ askReader }));

afterEach(cleanup);

it("keeps a wrong date as it was typed, says why, and shows the way to the letter only for the right one", async () => {
  const refusal = "This letter is about someone born on another day.";
  askReader.mockImplementation(async ({ attempt }, form) => {
    const bornOn = String(form.get("bornOn"));
    const isRight = bornOn === "22 6 1954";
    return { bornOn, isRight, problem: isRight ? null : refusal, attempt: attempt + 1 };
  });
  render(<LetterReaderForm token="secret-part" />);
  const field = () => screen.getByLabelText<HTMLInputElement>("The patient's date of birth");
  const goOn = () => fireEvent.click(screen.getByRole("button", { name: "Go on to the letter" }));
  fireEvent.change(field(), { target: { value: "23 6 1954" } });
  goOn();
  expect(await screen.findByRole("link", { name: refusal })).toBeTruthy();
  expect(field().value).toBe("23 6 1954");
  expect(screen.queryByRole("button", { name: "Open the letter" })).toBeNull();
  fireEvent.change(field(), { target: { value: "22 6 1954" } });
  goOn();
  const open = await screen.findByRole<HTMLButtonElement>("button", { name: "Open the letter" });
  expect(open.form?.getAttribute("action")).toBe("/link/secret-part/letter/pdf");
  expect(open.form?.method).toBe("post");
  expect(Object.fromEntries(new FormData(open.form ?? undefined))).toEqual({ bornOn: "22 6 1954" });
  expect(document.activeElement).toBe(open);
});
