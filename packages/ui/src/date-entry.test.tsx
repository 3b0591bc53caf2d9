// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, expect, test } from "vitest";
import { DateEntry } from "./date-entry";

afterEach(cleanup);

const today = "2026-12-01";

function Harness({ past = false, report }: { past?: boolean; report: (date: string | null) => void }) {
  const [text, setText] = useState("");
  const take = (next: string, date: string | null) => {
    setText(next);
    report(date);
  };
  return <DateEntry id="when" label="When" value={text} onChange={take} today={today} past={past} />;
}

const cases = [
  { typed: "tomorrow", past: false, date: "2026-12-02", shown: "Wednesday 2 December 2026" },
  { typed: "next tue", past: false, date: "2026-12-08", shown: "Tuesday 8 December 2026" },
  { typed: "6/5/27", past: false, date: "2027-05-06", shown: "Thursday 6 May 2027" },
  { typed: "27 3 58", past: true, date: "1958-03-27", shown: "Thursday 27 March 1958" },
];

test.each(cases)("reads '$typed' and shows what it understood", ({ typed, past, date, shown }) => {
  const reported: (string | null)[] = [];
  render(<Harness past={past} report={(d) => reported.push(d)} />);
  fireEvent.change(screen.getByLabelText("When"), { target: { value: typed } });
  expect(reported.at(-1)).toBe(date);
  expect(screen.getByText(shown)).toBeTruthy();
});

test("keeps what was typed when it is no date, and says how to go on", () => {
  const reported: (string | null)[] = [];
  render(<Harness report={(d) => reported.push(d)} />);
  const field = screen.getByLabelText<HTMLInputElement>("When");
  fireEvent.change(field, { target: { value: "31 february" } });
  expect(reported.at(-1)).toBeNull();
  expect(field.value).toBe("31 february");
  expect(screen.getByText(/^Not a date yet/)).toBeTruthy();
});
