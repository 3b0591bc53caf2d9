import type { PutAsideItem } from "@withy/contracts/diary";
import { plainDateWords } from "@withy/core/date-words";
import { isPlainDate } from "@withy/core/plain-date";
import { urgencies } from "@withy/diary/rank-time";
import type { ComboboxOption } from "@withy/ui/combobox";
import { concerns, type Wishes } from "./find-wishes";
import { readTime } from "./minute-words";
import type { WantedTime } from "./wanted-time";

/** A booking as it stands in its form. */
export interface TypedBooking {
  wanted: WantedTime;
  patient: ComboboxOption | null;
  serviceId: string;
  deskNote?: string;
  reason?: string;
  /** What it lies in the tray as, where it does. */
  asideId?: string | null;
}

type Typed = PutAsideItem["typed"];

const textOf = (typed: Typed, name: string): string => {
  const value = typed[name];
  return typeof value === "string" ? value : "";
};
const textsOf = (typed: Typed, name: string): readonly string[] => {
  const value = typed[name];
  return Array.isArray(value) ? value : [];
};
const dayOf = (typed: Typed, name: string): string | null => {
  const text = textOf(typed, name);
  return isPlainDate(text) ? text : null;
};

function patientOf({ patient }: PutAsideItem): ComboboxOption | null {
  return patient && { id: patient.id, label: patient.name, detail: `born ${plainDateWords(patient.bornOn)}` };
}

/** "Follow-up, Tamsin Roe, Thu 8 Dec 10:15", as far as it is known. */
function titleOf(parts: readonly (string | undefined)[], otherwise: string): string {
  const known = parts.filter((part): part is string => Boolean(part));
  return (known.length > 0 ? known.join(", ") : otherwise).slice(0, 120);
}

export function asideBooking(form: TypedBooking, serviceName: string | undefined) {
  const { wanted, patient, serviceId, deskNote = "", reason = "", asideId = null } = form;
  const when = [wanted.dayText, readTime(wanted.timeText) ?? wanted.timeText].filter(Boolean).join(" ");
  const { day, ...texts } = wanted;
  return {
    itemId: asideId,
    kind: "booking" as const,
    title: titleOf([serviceName, patient?.label, when], "A booking"),
    patientId: patient?.id ?? null,
    typed: { ...texts, day: day ?? "", serviceId, deskNote, reason },
  };
}

export function bookingAside(item: PutAsideItem): TypedBooking {
  const { typed } = item;
  return {
    wanted: {
      dayText: textOf(typed, "dayText"),
      day: dayOf(typed, "day"),
      timeText: textOf(typed, "timeText"),
      siteId: textOf(typed, "siteId"),
      therapistId: textOf(typed, "therapistId"),
      roomId: textOf(typed, "roomId"),
    },
    patient: patientOf(item),
    serviceId: textOf(typed, "serviceId"),
    deskNote: textOf(typed, "deskNote"),
    reason: textOf(typed, "reason"),
    asideId: item.id,
  };
}

export function asideFinding(
  wishes: Wishes,
  patient: ComboboxOption | null,
  serviceName: string | undefined,
  itemId: string | null,
) {
  const { weekdays, siteIds, windows, needs, order, earliestOn, latestOn, ...texts } = wishes;
  return {
    itemId,
    kind: "finding" as const,
    title: titleOf(["Find a time", serviceName, patient?.label], "Find a time"),
    patientId: patient?.id ?? null,
    typed: {
      ...texts,
      earliestOn: earliestOn ?? "",
      latestOn: latestOn ?? "",
      weekdays: [...weekdays],
      siteIds: [...siteIds],
      windows: [...windows],
      needs: [...needs],
      order: [...order],
    },
  };
}

/** The wishes again. What this version of the form does not know is left out. */
export function findingAside(item: PutAsideItem): { wishes: Wishes; patient: ComboboxOption | null } {
  const { typed } = item;
  const text = (name: string) => textOf(typed, name);
  const order = textsOf(typed, "order").flatMap((one) => concerns.filter((concern) => concern === one));
  return {
    wishes: {
      serviceId: text("serviceId"),
      weekdays: textsOf(typed, "weekdays"),
      fromText: text("fromText"),
      untilText: text("untilText"),
      earliestText: text("earliestText"),
      earliestOn: dayOf(typed, "earliestOn"),
      latestText: text("latestText"),
      latestOn: dayOf(typed, "latestOn"),
      therapistId: text("therapistId"),
      siteIds: textsOf(typed, "siteIds"),
      windows: textsOf(typed, "windows"),
      needs: textsOf(typed, "needs"),
      urgency: urgencies.find((one) => one === text("urgency")) ?? "routine",
      order: new Set(order).size === concerns.length ? order : [],
    },
    patient: patientOf(item),
  };
}
