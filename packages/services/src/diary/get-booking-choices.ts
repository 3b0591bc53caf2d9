import { type BookingChoicesView, getBookingChoicesInput } from "@withy/contracts/diary";
import { dayOf } from "@withy/core/zoned-time";
import { rooms, services, serviceTherapists, sites, staffMembers, workingPatterns } from "@withy/db/schema";
import { and, asc, eq, gte, isNull, or } from "drizzle-orm";
import { verb } from "../verb";
import { readFindingWeights } from "./finding-weights";
import { reachableSites } from "./site-reach";

/** What a booking form offers: everything active, at the sites where this person may book. */
export const getBookingChoices = verb(
  "diary.book",
  getBookingChoicesInput,
  async (ctx): Promise<BookingChoicesView> => {
    const { db, practiceId } = ctx;
    const now = ctx.clock.now();
    const reach = new Set(await reachableSites(ctx, "diary.book"));
    const [siteRows, serviceRows, gives, people, works, roomRows, weights] = await Promise.all([
      db.select().from(sites).where(eq(sites.practiceId, practiceId)).orderBy(asc(sites.position)),
      db
        .select()
        .from(services)
        .where(and(eq(services.practiceId, practiceId), eq(services.isActive, true)))
        .orderBy(asc(services.position)),
      db.select().from(serviceTherapists).where(eq(serviceTherapists.practiceId, practiceId)),
      db
        .select()
        .from(staffMembers)
        .where(
          and(
            eq(staffMembers.practiceId, practiceId),
            eq(staffMembers.isTherapist, true),
            eq(staffMembers.isActive, true),
          ),
        )
        .orderBy(asc(staffMembers.position)),
      db
        .selectDistinct({ staffMemberId: workingPatterns.staffMemberId, siteId: workingPatterns.siteId })
        .from(workingPatterns)
        .where(
          and(
            eq(workingPatterns.practiceId, practiceId),
            or(isNull(workingPatterns.validUntil), gte(workingPatterns.validUntil, dayOf(now, ctx.zone))),
          ),
        ),
      db.select().from(rooms).where(eq(rooms.practiceId, practiceId)).orderBy(asc(rooms.position)),
      readFindingWeights(ctx),
    ]);
    const active = new Set(people.map((p) => p.id));
    return {
      weights,
      sites: siteRows
        .filter((s) => reach.has(s.id))
        .map((s) => ({ id: s.id, name: s.name, zone: s.zone, today: dayOf(now, s.zone) })),
      services: serviceRows.flatMap(({ id, name, kind, durationMinutes, cleanDownMinutes, roomKind }) => {
        // A class has its own times; nobody books one for a single patient.
        if (kind === "class") return [];
        const therapistIds = gives
          .filter((g) => g.serviceId === id && active.has(g.staffMemberId))
          .map((g) => g.staffMemberId);
        return [{ id, name, kind, durationMinutes, cleanDownMinutes, roomKind, therapistIds }];
      }),
      therapists: people.map((p) => ({
        id: p.id,
        name: `${p.givenName} ${p.familyName}`,
        siteIds: works.filter((w) => w.staffMemberId === p.id && reach.has(w.siteId)).map((w) => w.siteId),
      })),
      rooms: roomRows
        .filter((r) => reach.has(r.siteId))
        .map(({ id, name, siteId, kind }) => ({ id, name, siteId, kind })),
    };
  },
);
