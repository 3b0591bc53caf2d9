import type { Permission } from "@withy/core/access/permissions";

export interface Shortcut {
  readonly id: string;
  /** One key, or two pressed one after the other ("g d"). "mod+k" is Ctrl or Command. */
  readonly keys: string;
  readonly label: string;
  readonly group:
    | "Everywhere"
    | "Go to"
    | "Diary"
    | "Today"
    | "Note"
    | "Programme"
    | "Invoice"
    | "Patient"
    | "Letter";
  /** Goes to this address by itself; the others wait for a screen to handle them. */
  readonly href?: string;
  readonly permission?: Permission;
}

/** Every shortcut there is. The handler, the palette and the help sheet all read this one table. */
export const shortcuts = [
  { id: "palette", keys: "mod+k", label: "Find a command or a patient", group: "Everywhere" },
  { id: "search", keys: "/", label: "Find a patient", group: "Everywhere" },
  { id: "help", keys: "?", label: "Show all keys", group: "Everywhere" },
  { id: "recent", keys: "c", label: "Recent changes", group: "Everywhere" },
  { id: "go-today", keys: "g t", label: "Today", group: "Go to", href: "/today", permission: "diary.read" },
  { id: "go-diary", keys: "g d", label: "Diary", group: "Go to", href: "/diary", permission: "diary.read" },
  {
    id: "go-find",
    keys: "g f",
    label: "Find a time",
    group: "Go to",
    href: "/diary/find",
    permission: "diary.book",
  },
  {
    id: "go-waiting",
    keys: "g w",
    label: "Waiting list",
    group: "Go to",
    href: "/diary/waiting",
    permission: "diary.read",
  },
  {
    id: "go-cover",
    keys: "g c",
    label: "Arrange cover",
    group: "Go to",
    href: "/diary/cover",
    permission: "diary.book",
  },
  {
    id: "go-patients",
    keys: "g p",
    label: "Patients",
    group: "Go to",
    href: "/patients",
    permission: "patients.read",
  },
  {
    id: "go-register",
    keys: "g r",
    label: "Register a patient",
    group: "Go to",
    href: "/patients/new",
    permission: "patients.register",
  },
  {
    id: "go-notes",
    keys: "g n",
    label: "Notes to sign",
    group: "Go to",
    href: "/notes",
    permission: "clinical.write",
  },
  {
    id: "go-exercises",
    keys: "g e",
    label: "Exercises",
    group: "Go to",
    href: "/exercises",
    permission: "clinical.read",
  },
  {
    id: "go-letters",
    keys: "g l",
    label: "Letters",
    group: "Go to",
    href: "/letters",
    permission: "letters.read",
  },
  {
    id: "go-accounts",
    keys: "g a",
    label: "Accounts",
    group: "Go to",
    href: "/billing",
    permission: "billing.read",
  },
  {
    id: "go-month",
    keys: "g m",
    label: "The month",
    group: "Go to",
    href: "/reports/month",
    permission: "reports.read",
  },
  {
    id: "go-messages",
    keys: "g o",
    label: "Messages sent",
    group: "Go to",
    href: "/messages",
    permission: "messaging.read",
  },
  {
    id: "go-settings",
    keys: "g s",
    label: "Settings",
    group: "Go to",
    href: "/settings",
    permission: "practice.manage",
  },
  {
    id: "go-audit",
    keys: "g u",
    label: "Who did what",
    group: "Go to",
    href: "/settings/audit",
    permission: "audit.read",
  },
  { id: "book", keys: "b", label: "Book an appointment", group: "Diary" },
  { id: "add-waiting", keys: "w", label: "Add someone to the waiting list", group: "Diary" },
  { id: "move", keys: "m", label: "Move the appointment", group: "Diary" },
  { id: "diary-today", keys: "t", label: "Go to today", group: "Diary" },
  { id: "previous", keys: "[", label: "The day or week before", group: "Diary" },
  { id: "next", keys: "]", label: "The next day or week", group: "Diary" },
  { id: "arrive", keys: "a", label: "Arrived", group: "Diary" },
  { id: "start", keys: "s", label: "In session", group: "Diary" },
  { id: "finish", keys: "f", label: "Attended", group: "Diary" },
  { id: "noshow", keys: "n", label: "Did not attend", group: "Diary" },
  { id: "cancel", keys: "x", label: "Cancel the appointment", group: "Diary" },
  { id: "open", keys: "o", label: "Open the patient's record", group: "Diary" },
  { id: "put-aside", keys: "mod+.", label: "Put aside what is half made", group: "Diary" },
  { id: "resume", keys: "u", label: "Take up what was put aside last", group: "Diary" },
  { id: "pay", keys: "p", label: "Take a payment", group: "Invoice" },
  { id: "issue", keys: "i", label: "Issue the invoice", group: "Invoice" },
  { id: "edit", keys: "e", label: "Edit the patient's details", group: "Patient" },
  { id: "sign", keys: "mod+enter", label: "Sign", group: "Note" },
  { id: "measure", keys: "r", label: "Record a measure", group: "Note" },
  { id: "add-exercise", keys: "n", label: "Add an exercise", group: "Programme" },
  { id: "easier", keys: ",", label: "Easier form of the exercise", group: "Programme" },
  { id: "harder", keys: ".", label: "Harder form of the exercise", group: "Programme" },
] as const satisfies readonly Shortcut[];

export type ShortcutId = (typeof shortcuts)[number]["id"];

export function shortcutFor(id: ShortcutId): Shortcut {
  const found = shortcuts.find((s) => s.id === id);
  if (!found) throw new Error(`There is no shortcut called ${id}.`);
  return found;
}

/** How a shortcut is written on a key: "Ctrl K", "G then D". */
export function keyWords(keys: string): string {
  return keys
    .split(" ")
    .map((part) =>
      part
        .split("+")
        .map((k) => (k === "mod" ? "Ctrl" : k === "enter" ? "Enter" : k.toUpperCase()))
        .join(" "),
    )
    .join(" then ");
}
