import * as audit from "@withy/services/audit";
import * as billing from "@withy/services/billing";
import * as clinical from "@withy/services/clinical";
import * as diary from "@withy/services/diary";
import * as letters from "@withy/services/letters";
import * as messaging from "@withy/services/messaging";
import * as patients from "@withy/services/patients";
import * as practices from "@withy/services/practices";
import * as reports from "@withy/services/reports";
import type { Verb } from "@withy/services/verb";

export interface NamedVerb {
  readonly area: string;
  readonly name: string;
  readonly verb: Verb;
}

const areas = { audit, billing, clinical, diary, letters, messaging, patients, practices, reports };

const isVerb = (value: unknown): value is Verb =>
  typeof value === "function" && "permission" in value && "input" in value;

/** Everything that can be done, found by its shape in what each area gives out. */
export const verbs: readonly NamedVerb[] = Object.entries(areas).flatMap(([area, given]) =>
  Object.entries(given).flatMap(([name, value]) => (isVerb(value) ? [{ area, name, verb: value }] : [])),
);
