import { AppError } from "@withy/core/errors";
import { isId } from "@withy/core/ids";
import { dayBounds, isPlainDate } from "@withy/core/zoned-time";

/** What a search asks for. Times are milliseconds, `to` is without itself; null leaves an end open. */
export interface FhirQuery {
  readonly from: number | null;
  readonly to: number | null;
  readonly practitioners: readonly string[] | null;
  readonly locations: readonly string[] | null;
  readonly statuses: readonly string[] | null;
  readonly schedules: readonly string[] | null;
  readonly count: number;
  /** Where the page before ended. */
  readonly after: string | null;
}

export interface Askable {
  readonly dates: readonly string[];
  readonly statuses: readonly string[] | null;
  readonly canNameSchedule?: boolean;
}

const usualCount = 50;
const mostCount = 200;

const refuse = (message: string, kind = "invalid") => new AppError("invalid", message, { kind });

const instant = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2}(\.\d+)?)?(Z|[+-]\d{2}:\d{2})$/;

/** The stretch that a date stands for: a whole day on the practice's clock, or one instant. */
function stretch(text: string, zone: string): { from: number; to: number } | null {
  if (isPlainDate(text)) {
    const { from, to } = dayBounds(text, zone);
    return { from: from.getTime(), to: to.getTime() };
  }
  // A plus that was not escaped arrives as a space.
  const written = text.replace(/ (\d{2}:\d{2})$/, "+$1");
  const at = instant.test(written) && isPlainDate(written.slice(0, 10)) ? Date.parse(written) : Number.NaN;
  return Number.isNaN(at) ? null : { from: at, to: at + 1 };
}

interface Bounds {
  from: number | null;
  to: number | null;
}

function narrow(bounds: Bounds, name: string, value: string, zone: string): void {
  const [, prefix = "", text = ""] = /^([a-z]{2}(?=\d))?(.*)$/.exec(value) ?? [];
  if (!["", "eq", "ge", "gt", "le", "lt"].includes(prefix))
    throw refuse(`${name} takes eq, ge, gt, le and lt, such as ${name}=ge2026-12-01.`, "not-supported");
  const at = stretch(text, zone);
  if (!at)
    throw refuse(`Give ${name} as a date such as 2026-12-01, or as an instant such as 2026-12-01T09:00:00Z.`);
  const isExact = prefix === "" || prefix === "eq";
  const from = isExact || prefix === "ge" ? at.from : prefix === "gt" ? at.to : null;
  const to = isExact || prefix === "le" ? at.to : prefix === "lt" ? at.from : null;
  if (from !== null) bounds.from = Math.max(bounds.from ?? from, from);
  if (to !== null) bounds.to = Math.min(bounds.to ?? to, to);
}

function references(params: URLSearchParams, name: string, type: string): string[] | null {
  const given = params.get(name);
  if (given === null) return null;
  return given.split(",").map((one) => {
    const id = one.replace(new RegExp(`^${type}/`), "");
    if (!isId(id)) throw refuse(`Give ${name} as ${type}/ and an id, as answers of this server name it.`);
    return id.toLowerCase();
  });
}

function codes(params: URLSearchParams, known: readonly string[] | null): string[] | null {
  const given = params.get("status")?.split(",") ?? null;
  const strange = given?.find((code) => !known?.includes(code));
  if (strange !== undefined) throw refuse(`status takes ${known?.join(", ")}.`);
  return given;
}

function countOf(params: URLSearchParams): number {
  const given = params.get("_count");
  if (given === null) return usualCount;
  const count = /^\d{1,4}$/.test(given) ? Number(given) : 0;
  if (count < 1) throw refuse(`Give _count as a whole number from 1 to ${mostCount}.`);
  return Math.min(count, mostCount);
}

/** Reads a search's parameters. @throws invalid with what to send instead, for anything that would be left unheeded */
export function readQuery(params: URLSearchParams, zone: string, askable: Askable): FhirQuery {
  const known = [
    ...askable.dates,
    "practitioner",
    "location",
    ...(askable.statuses === null ? [] : ["status"]),
    ...(askable.canNameSchedule ? ["schedule"] : []),
    "_count",
    "_after",
    "_format",
  ];
  for (const name of new Set(params.keys())) {
    if (!known.includes(name))
      throw refuse(`${name.slice(0, 40)} cannot be asked here. Use ${known.join(", ")}.`, "not-supported");
    if (!askable.dates.includes(name) && params.getAll(name).length > 1)
      throw refuse(`Give ${name} once, with commas between several values.`);
  }
  const format = params.get("_format");
  if (format !== null && !["json", "application/json", "application/fhir+json"].includes(format))
    throw refuse("Only JSON is given. Leave _format out, or send json.", "not-supported");
  const bounds: Bounds = { from: null, to: null };
  for (const name of askable.dates)
    for (const value of params.getAll(name)) narrow(bounds, name, value, zone);
  return {
    ...bounds,
    practitioners: references(params, "practitioner", "Practitioner"),
    locations: references(params, "location", "Location"),
    statuses: codes(params, askable.statuses),
    schedules:
      params
        .get("schedule")
        ?.split(",")
        .map((one) => one.replace(/^Schedule\//, "")) ?? null,
    count: countOf(params),
    after: params.get("_after"),
  };
}

/** A `_after` that this server did not give. */
export const strangePage = () => refuse("This page's address is not complete. Start the search again.");
