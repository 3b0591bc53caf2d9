/** "10:45" from minutes after midnight. */
export function clock(minute: number): string {
  return `${Math.floor(minute / 60)
    .toString()
    .padStart(2, "0")}:${(minute % 60).toString().padStart(2, "0")}`;
}

/** Minutes after midnight from "10:45". */
export function minuteOf(time: string): number {
  const [h = 0, m = 0] = time.split(":").map(Number);
  return h * 60 + m;
}

/** "9", "5:30": the short way that working hours are said. */
export function shortClock(minute: number): string {
  const hour = Math.floor(minute / 60) % 12 || 12;
  const rest = minute % 60;
  return rest === 0 ? `${hour}` : `${hour}:${rest.toString().padStart(2, "0")}`;
}

/** "45 min", "1 h", "3 h 15": whole minutes, a part of one left out. */
export function span(minutes: number): string {
  const whole = Math.floor(minutes);
  if (whole < 60) return `${whole} min`;
  const rest = whole % 60;
  return rest === 0 ? `${Math.floor(whole / 60)} h` : `${Math.floor(whole / 60)} h ${rest}`;
}

/**
 * Reads a time as people type it: "10:15", "10.15", "1015", "930", "9", "2:30pm". Null where it is none.
 * Hours 1 to 6 without am or pm are taken as afternoon, since no clinic opens then (common practice).
 */
export function readTime(text: string): string | null {
  const match = /^\s*(\d{1,2})(?:[:.\s]?(\d{2}))?\s*(am|pm)?\s*$/i.exec(text);
  if (!match) return null;
  let hour = Number(match[1]);
  const minute = Number(match[2] ?? "0");
  const half = match[3]?.toLowerCase();
  if (hour > 23 || minute > 59 || (half !== undefined && (hour < 1 || hour > 12))) return null;
  if (half === "pm" && hour < 12) hour += 12;
  if (half === "am" && hour === 12) hour = 0;
  if (half === undefined && hour >= 1 && hour <= 6 && !text.trim().startsWith("0")) hour += 12;
  return clock(hour * 60 + minute);
}
