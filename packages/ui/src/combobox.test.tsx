// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { useState } from "react";
import { afterEach, expect, test } from "vitest";
import { Combobox, type ComboboxOption } from "./combobox";

afterEach(cleanup);

const people: ComboboxOption[] = [
  { id: "a", label: "Eleri Tamworth", detail: "22 June 1963" },
  { id: "b", label: "Eleanor Tame", detail: "4 May 1990" },
];

function Harness({
  search,
  report,
}: {
  search: (text: string, signal: AbortSignal) => Promise<ComboboxOption[]>;
  report: (id: string | undefined) => void;
}) {
  const [value, setValue] = useState<ComboboxOption | null>(null);
  const take = (option: ComboboxOption | null) => {
    setValue(option);
    report(option?.id);
  };
  return <Combobox id="patient" label="Patient" value={value} onChange={take} search={search} />;
}

async function type(text: string) {
  const field = screen.getByLabelText<HTMLInputElement>("Patient");
  await act(async () => {
    field.focus();
    fireEvent.change(field, { target: { value: text } });
  });
  return field;
}

test("a newer keystroke cancels the older question, and arrows and Enter take an option", async () => {
  const asked: { text: string; signal: AbortSignal }[] = [];
  const taken: (string | undefined)[] = [];
  const search = async (text: string, signal: AbortSignal) => {
    asked.push({ text, signal });
    return people;
  };
  render(<Harness search={search} report={(id) => taken.push(id)} />);
  await type("el");
  await type("ele");
  const field = await type("elea");
  await screen.findByRole("option", { name: /Eleanor Tame/ });
  await waitFor(() => expect(asked.at(-1)?.text).toBe("elea"));
  expect(asked.slice(0, -1).every((question) => question.signal.aborted)).toBe(true);
  expect(asked.at(-1)?.signal.aborted).toBe(false);
  await act(async () => void fireEvent.keyDown(field, { key: "ArrowDown" }));
  await act(async () => void fireEvent.keyDown(field, { key: "Enter" }));
  await waitFor(() => expect(taken).toEqual(["b"]));
  expect(field.value).toBe("Eleanor Tame");
});

test("Escape closes the list and not what is around it, and words that chose nothing stay", async () => {
  let reached = 0;
  document.addEventListener("keydown", () => {
    reached += 1;
  });
  render(<Harness search={async () => people} report={() => {}} />);
  const field = await type("el");
  await screen.findByRole("option", { name: /Eleri/ });
  await act(async () => void fireEvent.keyDown(field, { key: "Escape" }));
  expect(field.getAttribute("aria-expanded")).toBe("false");
  expect(reached).toBe(0);
  await act(async () => field.blur());
  expect(field.value).toBe("el");
});

test("one letter does not ask, and no match says what to do", async () => {
  const asked: string[] = [];
  const search = async (text: string) => {
    asked.push(text);
    return [];
  };
  render(<Harness search={search} report={() => {}} />);
  await type("e");
  await screen.findByText("Type 2 letters or more");
  await type("ez");
  await screen.findByText("No match. Try fewer letters or another spelling.");
  expect(asked).toEqual(["ez"]);
});
