import type { DayAppointment } from "@withy/contracts/diary";
import { useRouter } from "next/navigation";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import type { Mark } from "../components/sheet-states";

export interface DayKeys {
  /** The visit that single keys act on: the open sheet's, else the one under the cursor. */
  target: DayAppointment | null;
  may: { book: boolean; mark: boolean; cancel: boolean };
  onBook: () => void;
  onMove: () => void;
  onCancel: () => void;
  onMark: (appointment: DayAppointment, to: Mark) => void;
  onStep: (days: number) => void;
  onToday: () => void;
}

/** The diary's keys, each from the one table of shortcuts. */
export function useDayKeys({
  target,
  may,
  onBook,
  onMove,
  onCancel,
  onMark,
  onStep,
  onToday,
}: DayKeys): void {
  const router = useRouter();
  const canMark = may.mark && target !== null;
  const mark = (to: Mark) => () => target && onMark(target, to);
  useShortcut("book", onBook, may.book);
  useShortcut("move", onMove, may.book && target !== null);
  useShortcut("cancel", onCancel, may.cancel && target !== null);
  useShortcut("arrive", mark("arrived"), canMark);
  useShortcut("start", mark("in-session"), canMark);
  useShortcut("finish", mark("fulfilled"), canMark);
  useShortcut("noshow", mark("noshow"), canMark);
  useShortcut("open", () => target && router.push(`/patients/${target.patientId}`), target !== null);
  useShortcut("previous", () => onStep(-1));
  useShortcut("next", () => onStep(1));
  useShortcut("diary-today", onToday);
}
