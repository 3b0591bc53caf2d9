/** One therapist at one site: what a Schedule stands for. */
export interface ScheduleKey {
  readonly therapistId: string;
  readonly siteId: string;
}

export type SlotStatus = "free" | "busy" | "busy-unavailable";

export interface SlotKey extends ScheduleKey {
  /** Milliseconds since the epoch, on the five-minute grid. */
  readonly from: number;
  readonly to: number;
  readonly status: SlotStatus;
}

const letterOf: Record<SlotStatus, string> = { free: "f", busy: "b", "busy-unavailable": "u" };

/** 22 letters for 16 bytes. FHIR ids hold 64 of letters, digits, "-" and "." and nothing else. */
const packed = (id: string): string =>
  Buffer.from(id.replaceAll("-", ""), "hex").toString("base64url").replaceAll("_", ".");

function unpacked(text: string): string | null {
  const hex = Buffer.from(text.replaceAll(".", "_"), "base64url").toString("hex");
  if (hex.length !== 32) return null;
  const id = hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5");
  return packed(id) === text ? id : null;
}

/** The id of a Schedule: both ids in 44 letters, so that none is kept anywhere. */
export const scheduleId = ({ therapistId, siteId }: ScheduleKey): string =>
  `${packed(therapistId)}${packed(siteId)}`;

/** The therapist and the site of a Schedule's id, or null for what is none. */
export function readScheduleId(text: string): ScheduleKey | null {
  if (!/^[A-Za-z0-9.-]{44}$/.test(text)) return null;
  const [therapistId, siteId] = [unpacked(text.slice(0, 22)), unpacked(text.slice(22))];
  return therapistId === null || siteId === null ? null : { therapistId, siteId };
}

/** The id of a Slot: its Schedule, its start in minutes, its length in steps of five, and what it is. */
export function slotId({ from, to, status, ...schedule }: SlotKey): string {
  const start = (from / 60_000).toString(36).padStart(6, "0");
  const steps = ((to - from) / 300_000).toString(36).padStart(3, "0");
  return `${scheduleId(schedule)}${start}${steps}${letterOf[status]}`;
}

/** The Schedule and the start of a Slot's id, or null for what is none. */
export function readSlotId(text: string): (ScheduleKey & { from: number }) | null {
  const schedule = readScheduleId(text.slice(0, 44));
  if (schedule === null || !/^[0-9a-z]{9}[fbu]$/.test(text.slice(44))) return null;
  return { ...schedule, from: Number.parseInt(text.slice(44, 50), 36) * 60_000 };
}
