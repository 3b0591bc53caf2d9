import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import type { DayAppointment, DiaryDayView } from "@withy/contracts/diary";
import { useState } from "react";
import { afterEach, expect, test } from "vitest";
import type { Cursor } from "../day-cursor";
import { DayGrid } from "./day-grid";

// jsdom lays nothing out and cannot scroll.
Element.prototype.scrollIntoView = () => {};

afterEach(cleanup);

function visit(
  id: string,
  patientName: string,
  fromMinute: number,
  state: DayAppointment["state"],
): DayAppointment {
  return {
    id,
    version: 1,
    state,
    startsAt: "2026-12-01T10:45:00.000Z",
    endsAt: "2026-12-01T11:15:00.000Z",
    fromMinute,
    untilMinute: fromMinute + 30,
    cleanDownMinutes: 0,
    siteId: "saltgate",
    therapistId: "nia",
    therapistName: "Nia Prosser",
    roomId: "reed",
    roomName: "Reed",
    patientId: `patient of ${id}`,
    patientName,
    serviceId: "follow-up",
    serviceName: "Follow-up",
    serviceKind: "follow-up",
    hasDeskNote: false,
  };
}

const column = (id: string, name: string, appointments: DayAppointment[]) => ({
  id,
  name,
  siteId: "saltgate",
  hours: [{ fromMinute: 540, untilMinute: 1020 }],
  blocks: [],
  free: [{ fromMinute: 675, untilMinute: 1020 }],
  freeMinutes: 345,
  appointments,
});

const day: DiaryDayView = {
  day: "2026-12-01",
  by: "therapist",
  sites: [{ id: "saltgate", name: "Saltgate", zone: "Europe/London", hours: null, closedReason: null }],
  bounds: { fromMinute: 540, untilMinute: 1020 },
  nowMinute: 642,
  columns: [
    column("nia", "Nia Prosser", [visit("a", "Thandiwe Marsh", 645, "arrived")]),
    column("callum", "Callum Reyes", [visit("b", "Sunil Rathod", 660, "confirmed")]),
  ],
  counts: { booked: 2, waiting: 1, gaps: 2 },
  pulse: null,
};

function Harness({ opened, booked }: { opened: string[]; booked: Cursor[] }) {
  const [cursor, setCursor] = useState<Cursor>({ column: 0, minute: 640 });
  return (
    <DayGrid
      day={day}
      today="2026-12-01"
      now={642}
      cursor={cursor}
      onCursor={setCursor}
      chosenId={null}
      onOpen={(a) => opened.push(a.patientName)}
      onBook={() => booked.push(cursor)}
      onColumns={() => {}}
    />
  );
}

const press = (key: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key });
const focused = () => document.activeElement?.getAttribute("aria-label");

test("one cell of the grid takes the Tab key, and arrows carry the focus over visits and free places", () => {
  const opened: string[] = [];
  const booked: Cursor[] = [];
  render(<Harness opened={opened} booked={booked} />);
  const cells = screen.getAllByRole("gridcell");
  expect(cells.filter((cell) => cell.tabIndex === 0)).toHaveLength(1);
  screen.getByRole("gridcell", { name: "10:40, Nia Prosser, over" }).focus();

  press("ArrowDown");
  expect(focused()).toBe("10:45 to 11:15, Thandiwe Marsh, Follow-up, Reed, Arrived");
  press("Enter");
  expect(opened).toEqual(["Thandiwe Marsh"]);

  press("ArrowDown");
  expect(focused()).toBe("11:15, Nia Prosser, free for 5 h 45");
  press("Enter");
  expect(booked).toEqual([{ column: 0, minute: 675 }]);

  press("ArrowRight");
  expect(focused()).toBe("11:00 to 11:30, Sunil Rathod, Follow-up, Reed, Confirmed");
  expect(screen.getAllByRole("gridcell").filter((cell) => cell.tabIndex === 0)).toHaveLength(1);
});

test("a visit says its place among the columns and how many steps it lasts", () => {
  render(<Harness opened={[]} booked={[]} />);
  const cell = screen.getByRole("gridcell", { name: /Sunil Rathod/ });
  expect(cell.getAttribute("aria-colindex")).toBe("3");
  expect(cell.getAttribute("aria-rowspan")).toBe("6");
  expect(screen.getByRole("grid").getAttribute("aria-rowcount")).toBe("97");
  expect(screen.getAllByRole("columnheader").map((head) => head.querySelector("b")?.textContent)).toEqual([
    undefined,
    "Nia Prosser",
    "Callum Reyes",
  ]);
});
