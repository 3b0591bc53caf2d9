import { newId } from "@withy/core/ids";
import { rooms, siteHours, sites } from "@withy/db/schema";
import type { PracticeBase } from "./practice-base";

const weekdays = [1, 2, 3, 4, 5];

/** Saltgate: two treatment rooms and a gym, open on Saturday mornings. Tollhouse Lane: one room. */
export async function addSites({ db, practiceId, clock }: PracticeBase) {
  const common = { practiceId, createdAt: clock.now(), phone: "+441632960101" };
  const saltgate = {
    ...common,
    id: newId(),
    name: "Saltgate",
    addressLines: ["2 Saltgate", "Easterhaven"],
    postcode: "ZZ1 2AB",
    isStepFree: true,
    position: 0,
  };
  const tollhouse = {
    ...common,
    id: newId(),
    name: "Tollhouse Lane",
    addressLines: ["9 Tollhouse Lane", "Easterhaven"],
    postcode: "ZZ2 4CD",
    isStepFree: false,
    position: 1,
  };
  await db.insert(sites).values([saltgate, tollhouse]);
  const hours = (siteId: string, weekday: number, opensAt: string, closesAt: string) => ({
    practiceId,
    siteId,
    weekday,
    opensAt,
    closesAt,
  });
  await db
    .insert(siteHours)
    .values([
      ...weekdays.flatMap((day) => [
        hours(saltgate.id, day, "08:00", "19:00"),
        hours(tollhouse.id, day, "08:00", "18:00"),
      ]),
      hours(saltgate.id, 6, "09:00", "13:00"),
    ]);
  const room = (siteId: string, name: string, kind: "treatment" | "gym", position: number) => ({
    practiceId,
    id: newId(),
    siteId,
    name,
    kind,
    position,
  });
  const saltgateRoom1 = room(saltgate.id, "Room 1", "treatment", 0);
  const saltgateRoom2 = room(saltgate.id, "Room 2", "treatment", 1);
  const saltgateGym = room(saltgate.id, "Gym", "gym", 2);
  const tollhouseRoom1 = room(tollhouse.id, "Room 1", "treatment", 0);
  await db.insert(rooms).values([saltgateRoom1, saltgateRoom2, saltgateGym, tollhouseRoom1]);
  return {
    sites: { saltgate, tollhouse },
    rooms: { saltgateRoom1, saltgateRoom2, saltgateGym, tollhouseRoom1 },
  };
}

export type TestSites = Awaited<ReturnType<typeof addSites>>;
