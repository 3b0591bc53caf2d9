import { regions, type Side, sides } from "@withy/clinical/episodes/sides";
import {
  type EpisodeState,
  type Outcome,
  outcomes,
  type ReferralSource,
  referralSources,
} from "@withy/clinical/episodes/states";
import type { FlagAnswer } from "@withy/clinical/findings/red-flags";
import { flagAnswers } from "@withy/clinical/findings/red-flags";
import { z } from "zod";
import { idField, optionalText, plainDateField, requiredText, versionField } from "../fields";

const regionKeys = regions.map((region) => region.key);

export const openEpisodeInput = z.strictObject({
  patientId: idField,
  siteId: idField,
  /** The visit that it is opened for, where there is one. */
  appointmentId: idField.nullish(),
  problem: requiredText(160, "Enter the problem in a few words."),
  region: z.string().refine((key) => regionKeys.includes(key), "Choose the region from the list."),
  side: z.enum(sides, "Choose a side, or no side."),
  referralSource: z.enum(referralSources, "Choose who sent the patient.").default("self"),
  referredBy: optionalText(160, "The referrer's name"),
  referredOn: plainDateField.nullish(),
  reason: optionalText(2000, "The reason for referral"),
  goals: z
    .array(requiredText(300, "Write the goal, or take the line out."))
    .max(8, "Keep to eight goals.")
    .default([]),
  plannedVisits: z
    .int("Enter a whole number of visits.")
    .min(1, "Enter a whole number of visits.")
    .max(60, "Enter 60 visits or fewer.")
    .nullish(),
});
export type OpenEpisodeInput = z.input<typeof openEpisodeInput>;

export const episodeIdInput = z.strictObject({ episodeId: idField });
export const listEpisodesInput = z.strictObject({ patientId: idField });

export const saveGoalsInput = z.strictObject({
  episodeId: idField,
  version: versionField,
  goals: z
    .array(
      z.strictObject({
        text: requiredText(300, "Write the goal, or take the line out."),
        isMet: z.boolean(),
      }),
    )
    .max(8, "Keep to eight goals."),
});

export const recordRedFlagsInput = z.strictObject({
  episodeId: idField,
  version: versionField,
  answers: z.record(z.string().max(40), z.enum(flagAnswers)),
});
export type RecordRedFlagsInput = z.input<typeof recordRedFlagsInput>;

export const dischargeEpisodeInput = z.strictObject({
  episodeId: idField,
  version: versionField,
  outcome: z.enum(outcomes, "Choose how the episode ended."),
});
export type DischargeEpisodeInput = z.input<typeof dischargeEpisodeInput>;

export const reopenEpisodeInput = z.strictObject({ episodeId: idField, version: versionField });

/** Who is treated, as it stands at the head of every clinical page. */
export interface ClinicalPatient {
  readonly id: string;
  readonly name: string;
  readonly bornOn: string;
  readonly age: number;
  readonly nhsNumber: string | null;
  readonly alerts: readonly string[];
}

export interface EpisodeSummary {
  readonly id: string;
  readonly problem: string;
  readonly region: string;
  readonly side: Side;
  /** "Left hip". */
  readonly place: string;
  readonly state: EpisodeState;
  readonly openedOn: string;
  readonly dischargedOn: string | null;
  readonly therapistName: string;
  readonly siteName: string;
  readonly notes: number;
  readonly unsignedNotes: number;
}

export interface EpisodeNoteLine {
  readonly id: string;
  readonly kind: "initial" | "session";
  readonly state: "draft" | "signed";
  readonly visitNumber: number;
  readonly visitAt: string;
  readonly authorName: string;
  readonly addenda: number;
}

export interface GoalView {
  readonly text: string;
  readonly setOn: string;
  readonly metOn: string | null;
}

export interface EpisodeView extends EpisodeSummary {
  readonly patient: ClinicalPatient;
  readonly zone: string;
  readonly siteId: string;
  readonly therapistId: string;
  readonly referralSource: ReferralSource;
  readonly referredBy: string | null;
  readonly referredOn: string | null;
  readonly reason: string | null;
  readonly goals: readonly GoalView[];
  readonly plannedVisits: number | null;
  readonly outcome: Outcome | null;
  readonly redFlags: Readonly<Record<string, FlagAnswer>>;
  readonly noteLines: readonly EpisodeNoteLine[];
  readonly version: number;
}
