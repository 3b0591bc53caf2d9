import type { Change } from "@withy/clinical/measures/change";
import type { Series } from "@withy/clinical/measures/series";
import { z } from "zod";
import { idField, plainDateField } from "../fields";

const answer = z.number().nullable();

/** Shapes only: ranges belong to each measure, whose own rule names the item that is wrong. */
export const measureEntry = z.discriminatedUnion("form", [
  z.strictObject({ form: z.literal("items"), answers: z.array(answer).max(60) }),
  z.strictObject({
    form: z.literal("activities"),
    activities: z
      .array(
        z.strictObject({ name: z.string().trim().max(120, "Use 120 characters or fewer."), score: answer }),
      )
      .max(10),
  }),
  z.strictObject({
    form: z.literal("reading"),
    value: z.number("Enter a number."),
    usedArms: z.boolean().exactOptional(),
    steps: z.number().exactOptional(),
    walkingAid: z.string().trim().max(60).exactOptional(),
  }),
  z.strictObject({ form: z.literal("total"), value: z.number("Enter a number.") }),
]);

export const recordMeasureInput = z.strictObject({
  episodeId: idField,
  noteId: idField.nullish(),
  measureKey: z.string().max(40),
  entry: measureEntry,
  /** The site's today where absent. */
  takenOn: plainDateField.nullish(),
  /** The record that this one corrects; it then counts no more, but stays. */
  replaces: idField.nullish(),
});
export type RecordMeasureInput = z.input<typeof recordMeasureInput>;

export const listMeasuresInput = z.strictObject({ episodeId: idField });

export interface RecordedMeasure {
  readonly recordId: string;
  readonly measureKey: string;
  readonly takenOn: string;
  readonly scores: readonly {
    readonly scaleKey: string;
    readonly label: string;
    readonly shown: string;
    readonly change: Change | null;
    readonly importance: string | null;
    readonly reading: string | null;
  }[];
  /** What must be acted on now, whatever the total. */
  readonly alarm: string | null;
}

export interface MeasureSeriesView {
  readonly measureKey: string;
  readonly label: string;
  readonly shortLabel: string;
  readonly credit: string;
  readonly scales: readonly ScaleSeriesView[];
  /** The activities named last time, to be scored again. */
  readonly lastActivities: readonly string[];
}

export interface ScaleSeriesView extends Series {
  readonly label: string;
  readonly unit: string;
  readonly decimals: number;
  readonly better: "higher" | "lower";
  readonly min: number;
  readonly max: number | null;
  /** Whose error it is and where it was read: "MDC95, hip: BMC ...". */
  readonly errorSource: string | null;
}
