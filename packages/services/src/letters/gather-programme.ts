import { sessionTime } from "@withy/clinical/programmes/compute-time";
import { dayOf } from "@withy/core/zoned-time";
import { programmes, programmeVersions } from "@withy/db/schema";
import type { ProgrammeFact } from "@withy/documents/letter/discharge-facts";
import { and, desc, eq, isNotNull } from "drizzle-orm";
import { contentOf } from "../clinical/programmes/programme-records";
import type { Context } from "../context";
import { exerciseWords } from "./exercise-words";

/** The programme that the patient was last given in this episode; null where none was given out. */
export async function programmeFact(
  ctx: Context,
  episodeId: string,
  zone: string,
): Promise<ProgrammeFact | null> {
  const [row] = await ctx.db
    .select({ version: programmeVersions })
    .from(programmes)
    .innerJoin(
      programmeVersions,
      and(
        eq(programmeVersions.practiceId, programmes.practiceId),
        eq(programmeVersions.programmeId, programmes.id),
      ),
    )
    .where(
      and(
        eq(programmes.practiceId, ctx.practiceId),
        eq(programmes.episodeId, episodeId),
        isNotNull(programmeVersions.issuedAt),
      ),
    )
    .orderBy(desc(programmeVersions.issuedAt))
    .limit(1);
  if (!row?.version.issuedAt) return null;
  const content = contentOf(row.version);
  return {
    programmeId: row.version.programmeId,
    on: dayOf(row.version.issuedAt, zone),
    exercises: exerciseWords(content.items),
    rounds: content.rounds,
    sessionSeconds: sessionTime(content).elapsedSeconds,
    sessionsPerWeek: content.sessionsPerWeek,
  };
}
