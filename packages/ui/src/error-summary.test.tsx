// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { ErrorSummary } from "./error-summary";
import { TextInput } from "./text-input";

afterEach(cleanup);

const message = "Enter a phone number, or tick that there is none";

function Form({ attempt }: { attempt: number }) {
  const error = attempt > 0 ? message : undefined;
  return (
    <form>
      <ErrorSummary errors={error ? [{ id: "mobile", message: error }] : []} attempt={attempt} />
      <TextInput id="mobile" label="Mobile" error={error} />
    </form>
  );
}

test("a refused form moves the focus to the summary, and again at the next refusal", () => {
  const { rerender } = render(<Form attempt={0} />);
  expect(screen.queryByRole("alert")).toBeNull();
  rerender(<Form attempt={1} />);
  expect(document.activeElement).toBe(screen.getByRole("alert"));
  screen.getByLabelText("Mobile").focus();
  rerender(<Form attempt={2} />);
  expect(document.activeElement).toBe(screen.getByRole("alert"));
});

test("its link leads to the field that says the same words", () => {
  render(<Form attempt={1} />);
  fireEvent.click(screen.getByRole("link", { name: message }));
  const field = screen.getByLabelText("Mobile");
  expect(document.activeElement).toBe(field);
  expect(field.getAttribute("aria-invalid")).toBe("true");
  const described = document.getElementById(field.getAttribute("aria-describedby") ?? "");
  expect(described?.textContent).toBe(`Error: ${message}`);
});
