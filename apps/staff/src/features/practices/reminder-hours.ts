/** "48, 24" as numbers. What is no number stays one that the server refuses, so that it says what to do. */
export function readReminderHours(text: string): number[] {
  return text
    .split(/[\s,;]+|\band\b/)
    .filter((part) => part !== "")
    .map((part) => (/^\d{1,4}$/.test(part) ? Number(part) : -1));
}

export const reminderHoursWords = (hours: readonly number[]): string => hours.join(", ");
