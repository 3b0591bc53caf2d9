import { checkSide, type Side } from "@withy/clinical/episodes/sides";
import type { ReferralSource } from "@withy/clinical/episodes/states";
import type { OpenEpisodeInput } from "@withy/contracts/clinical";
import type { FieldError } from "@withy/ui/error-summary";

/** What stands in the form that opens an episode, as typed. */
export interface TypedEpisode {
  siteId: string;
  region: string;
  side: Side | "";
  problem: string;
  referralSource: ReferralSource;
  referredBy: string;
  reason: string;
  goals: string;
  plannedVisits: string;
}

/** What is missing or does not fit, in the words of the rule. */
export function problemsIn(typed: TypedEpisode): FieldError[] {
  const side =
    typed.side === ""
      ? "Choose a side, or no side."
      : typed.region === ""
        ? null
        : checkSide(typed.region, typed.side);
  return [
    typed.region === "" ? { id: "region", message: "Choose the region from the list." } : null,
    side === null ? null : { id: "side", message: side },
    typed.problem.trim() === "" ? { id: "problem", message: "Enter the problem in a few words." } : null,
    typed.plannedVisits !== "" && !/^\d+$/.test(typed.plannedVisits.trim())
      ? { id: "plannedVisits", message: "Enter a whole number of visits." }
      : null,
  ].filter((found) => found !== null);
}

export function emptyEpisode(siteId: string): TypedEpisode {
  return {
    siteId,
    region: "",
    side: "",
    problem: "",
    referralSource: "self",
    referredBy: "",
    reason: "",
    goals: "",
    plannedVisits: "",
  };
}

/** The form as the verb takes it; null while no side is chosen. */
export function episodeFrom(
  typed: TypedEpisode,
  about: { patientId: string; visitId: string | null },
): OpenEpisodeInput | null {
  const { goals, plannedVisits, side, ...rest } = typed;
  if (side === "") return null;
  return {
    ...rest,
    side,
    patientId: about.patientId,
    appointmentId: about.visitId,
    goals: goals
      .split("\n")
      .map((goal) => goal.trim())
      .filter((goal) => goal !== ""),
    plannedVisits: plannedVisits.trim() === "" ? null : Number(plannedVisits),
  };
}
