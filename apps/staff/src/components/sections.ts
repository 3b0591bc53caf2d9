import type { SectionTab, ThumbItem } from "@withy/ui/head";

interface Section {
  href: string;
  label: string;
  permission: string;
  thumb?: string;
}

const sections: readonly Section[] = [
  { href: "/today", label: "Today", permission: "diary.read", thumb: "Today" },
  { href: "/diary", label: "Diary", permission: "diary.read", thumb: "Diary" },
  { href: "/patients", label: "Patients", permission: "patients.read", thumb: "Patients" },
  { href: "/notes", label: "Notes to sign", permission: "clinical.write", thumb: "Write" },
  { href: "/exercises", label: "Exercises", permission: "clinical.read" },
  { href: "/letters", label: "Letters", permission: "letters.read" },
  { href: "/billing", label: "Accounts", permission: "billing.read", thumb: "Accounts" },
  { href: "/reports/month", label: "Month", permission: "reports.read", thumb: "Month" },
];

const isIn = (path: string, href: string) => path === href || path.startsWith(`${href}/`);

/** The sections this person may open, as the head's tabs. */
export function sectionsFor(
  permissions: readonly string[],
  path: string,
  counts: Readonly<Record<string, number>>,
): SectionTab[] {
  return sections
    .filter((s) => permissions.includes(s.permission))
    .map((s) => ({
      href: s.href,
      label: s.label,
      current: isIn(path, s.href),
      ...(counts[s.href] ? { count: counts[s.href] as number } : {}),
    }));
}

/** The same at the thumb, the few that matter on a phone. */
export function thumbsFor(permissions: readonly string[], path: string): ThumbItem[] {
  return sections
    .filter((s) => s.thumb !== undefined && permissions.includes(s.permission))
    .slice(0, 4)
    .map((s) => ({ href: s.href, label: s.thumb ?? s.label, current: isIn(path, s.href) }));
}
