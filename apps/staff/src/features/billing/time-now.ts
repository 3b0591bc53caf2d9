import { timeOf } from "@withy/core/wall-clock";

/** The clock on the wall of whoever sits at this screen, for the list of recent changes. */
export const timeNow = (): string => timeOf(new Date(), Intl.DateTimeFormat().resolvedOptions().timeZone);
