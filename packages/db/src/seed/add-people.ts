import { addDays, weekdayOf } from "@withy/core/zoned-time";
import { siteHours, staffAccounts, staffMembers, staffRoles, workingPatterns } from "../schema";
import { demoPasswordHash } from "./demo-password";
import type { PracticePlan, WorkPlan } from "./scenario/practice-plan";
import type { PersonRow, SiteRow, Stage } from "./stage";

interface Setting {
  practiceId: string;
  plan: PracticePlan;
  sites: ReadonlyMap<string, SiteRow>;
  createdAt: Date;
}

/** Writes everyone who works there, how they sign in, what they may do where, and when they work. */
export function addPeople(stage: Stage, { practiceId, plan, sites, createdAt }: Setting): PersonRow[] {
  const { rows, newId } = stage;
  const siteId = (key: string) => {
    const site = sites.get(key);
    if (!site) throw new RangeError(`The scenario has no site ${key}.`);
    return site.id;
  };
  const people = plan.people.map(
    (person, position): PersonRow => ({
      practiceId,
      id: newId(),
      givenName: person.given,
      familyName: person.family,
      jobTitle: person.title,
      registrationNumber: person.registration ?? null,
      isTherapist: person.work.length > 0,
      homeSiteId: siteId(person.home),
      position,
      createdAt,
      plan: person,
    }),
  );
  rows.add(staffMembers, ...people.map(({ plan: _plan, ...row }) => row));
  rows.add(
    staffAccounts,
    ...people.map(({ id, plan: person }) => ({
      id: newId(),
      practiceId,
      staffMemberId: id,
      email: person.signIn,
      passwordHash: demoPasswordHash,
      passwordChangedAt: createdAt,
    })),
  );
  for (const { id, plan: person } of people) {
    rows.add(
      staffRoles,
      ...person.roles.map(([role, at]) => ({
        practiceId,
        id: newId(),
        staffMemberId: id,
        role,
        siteId: at === null ? null : siteId(at),
      })),
    );
    for (const work of person.work) addPattern(stage, practiceId, id, siteId(work.site), work);
  }
  addExtraDay(stage, practiceId, people, siteId);
  return people;
}

function addPattern(
  { rows, newId, today }: Stage,
  practiceId: string,
  staffMemberId: string,
  siteId: string,
  work: WorkPlan,
): void {
  rows.add(
    workingPatterns,
    ...work.weekdays.map((weekday) => ({
      practiceId,
      id: newId(),
      staffMemberId,
      siteId,
      weekday,
      startsAt: work.startsAt,
      endsAt: work.endsAt,
      breaks: [...work.breaks],
      validFrom: addDays(today, -210 - weekdayOf(today)),
      everyWeeks: work.everyWeeks ?? 1,
    })),
  );
}

/** Where today is a Saturday or Sunday the weekday people work an extra day, so that the demonstration is never empty. */
function addExtraDay(
  { rows, newId, today }: Stage,
  practiceId: string,
  people: readonly PersonRow[],
  siteId: (key: string) => string,
): void {
  const weekday = weekdayOf(today);
  if (weekday < 6) return;
  const working = people.flatMap((person) => {
    const [first] = person.plan.work;
    return first && !person.plan.work.some((work) => work.weekdays.includes(weekday))
      ? [{ person, work: first }]
      : [];
  });
  rows.add(
    workingPatterns,
    ...working.map(({ person, work }) => ({
      practiceId,
      id: newId(),
      staffMemberId: person.id,
      siteId: siteId(work.site),
      weekday,
      startsAt: work.startsAt,
      endsAt: work.endsAt,
      breaks: [...work.breaks],
      validFrom: today,
      validUntil: today,
    })),
  );
  const open = new Set(
    rows
      .of(siteHours)
      .filter((row) => row.practiceId === practiceId && row.weekday === weekday)
      .map((row) => row.siteId),
  );
  for (const id of new Set(working.map(({ work }) => siteId(work.site)))) {
    if (!open.has(id))
      rows.add(siteHours, { practiceId, siteId: id, weekday, opensAt: "07:30", closesAt: "19:30" });
  }
}
