import { isPlainDate } from "@withy/core/plain-date";
import type { DayFilters } from "./api-client";

export interface DayAddress extends DayFilters {
  /** The visit whose sheet is open. */
  at: string | null;
}

const isId = (text: string) => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);

/** What the address of the diary says. Anything that it cannot mean is left out. */
export function readDayAddress(query: URLSearchParams): DayAddress {
  const day = query.get("day");
  const at = query.get("at");
  return {
    day: day && isPlainDate(day) ? day : undefined,
    siteIds: query.getAll("site").filter(isId),
    by: query.get("by") === "room" ? "room" : "therapist",
    at: at && isId(at) ? at : null,
  };
}

/** The address again, with what stays as it is by itself left out. */
export function writeDayAddress({ day, siteIds, by, at }: DayAddress): string {
  const query = new URLSearchParams();
  if (day) query.set("day", day);
  for (const id of siteIds) query.append("site", id);
  if (by === "room") query.set("by", by);
  if (at) query.set("at", at);
  const text = query.toString();
  return text === "" ? "/diary" : `/diary?${text}`;
}
