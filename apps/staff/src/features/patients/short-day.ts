const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "1 Dec" in the same year as `today`, else "1 Dec 2024". */
export function shortDay(day: string, today: string): string {
  const [year = "", month = "", date = ""] = day.split("-");
  const words = `${Number(date)} ${months[Number(month) - 1] ?? ""}`;
  return today !== "" && today.startsWith(year) ? words : `${words} ${year}`;
}

/** "22 Jun 1963". */
export function dayAndYear(day: string): string {
  return shortDay(day, "");
}
