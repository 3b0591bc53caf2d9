/** The address of one month, of one site or of all. */
export function monthAddress(month: string, siteId: string | null): string {
  return `/reports/month?month=${month}${siteId === null ? "" : `&siteId=${siteId}`}`;
}

/** So many months on from "2026-11". */
export function monthOn(month: string, by: number): string {
  const [year = 0, number = 1] = month.split("-").map(Number);
  const count = year * 12 + number - 1 + by;
  return `${Math.floor(count / 12)}-${String((count % 12) + 1).padStart(2, "0")}`;
}

/** In its first week a month has little to show, and the one before waits to be closed. */
export function usualMonth(today: string): string {
  const month = today.slice(0, 7);
  return Number(today.slice(8)) <= 7 ? monthOn(month, -1) : month;
}

const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "Nov". */
export function shortMonth(month: string): string {
  return months[Number(month.slice(5)) - 1] ?? "";
}
