const cache = new Map<string, Intl.DateTimeFormat>();

function formatter(zone: string, name: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${zone} ${name}`;
  const known = cache.get(key) ?? new Intl.DateTimeFormat("en-GB", { ...options, timeZone: zone });
  cache.set(key, known);
  return known;
}

/** "10:42" on the site's clock. */
export function clockAt(iso: string | Date, zone: string): string {
  return formatter(zone, "clock", { hour: "2-digit", minute: "2-digit", hourCycle: "h23" }).format(
    new Date(iso),
  );
}

/** "24 November", the site's day. */
export function dayAt(iso: string, zone: string): string {
  return formatter(zone, "day", { day: "numeric", month: "long" }).format(new Date(iso));
}

/** "2026-11-24", the site's day. */
export function isoDayAt(iso: string | Date, zone: string): string {
  return formatter(zone, "iso", { year: "numeric", month: "2-digit", day: "2-digit" })
    .formatToParts(new Date(iso))
    .filter((part) => part.type !== "literal")
    .reduceRight((text, part) => (text === "" ? part.value : `${text}-${part.value}`), "");
}

/** "Tuesday 24 November" of a plain date or of an instant. */
export function weekdayAt(iso: string, zone: string): string {
  const options = { weekday: "long", day: "numeric", month: "long" } as const;
  return formatter(zone, "weekday", options).format(new Date(iso)).replace(",", "");
}

/** "24 Nov" of a plain date such as "2026-11-24". */
export function shortDay(day: string): string {
  return formatter("UTC", "short", { day: "numeric", month: "short" }).format(new Date(`${day}T00:00:00Z`));
}

/** "24 November 2026" of a plain date. */
export function longDay(day: string): string {
  return formatter("UTC", "long", { day: "numeric", month: "long", year: "numeric" }).format(
    new Date(`${day}T00:00:00Z`),
  );
}
