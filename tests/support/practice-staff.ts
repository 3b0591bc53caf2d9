import type { Role } from "@withy/core/access/roles";
import { newId } from "@withy/core/ids";
import { staffAccounts, staffMembers, staffRoles, workingPatterns } from "@withy/db/schema";
import { demoPasswordHash } from "@withy/db/seed/demo-password";
import type { PracticeBase } from "./practice-base";
import type { TestSites } from "./practice-sites";

interface Person {
  givenName: string;
  familyName: string;
  jobTitle: string;
  home: "saltgate" | "tollhouse";
  /** Role, and the site it is held at; null is everywhere. */
  roles: [Role, "saltgate" | "tollhouse" | null][];
  registrationNumber?: string;
}

const people = {
  owner: {
    givenName: "Morwenna",
    familyName: "Teague",
    jobTitle: "practice owner",
    home: "saltgate",
    roles: [["owner", null]],
  },
  owningTherapist: {
    givenName: "Idris",
    familyName: "Vane",
    jobTitle: "physiotherapist and owner",
    home: "saltgate",
    roles: [
      ["owner", null],
      ["therapist", null],
    ],
    registrationNumber: "PH100001",
  },
  therapist: {
    givenName: "Ana",
    familyName: "Ferreby",
    jobTitle: "physiotherapist",
    home: "saltgate",
    roles: [["therapist", null]],
    registrationNumber: "PH100002",
  },
  otherTherapist: {
    givenName: "Tomasz",
    familyName: "Hale",
    jobTitle: "physiotherapist",
    home: "tollhouse",
    roles: [["therapist", null]],
    registrationNumber: "PH100003",
  },
  receptionist: {
    givenName: "Bea",
    familyName: "Lockyer",
    jobTitle: "receptionist",
    home: "saltgate",
    roles: [["receptionist", "saltgate"]],
  },
  tollhouseReceptionist: {
    givenName: "Col",
    familyName: "Purdy",
    jobTitle: "receptionist",
    home: "tollhouse",
    roles: [["receptionist", "tollhouse"]],
  },
  accounts: {
    givenName: "Dilys",
    familyName: "Marsh",
    jobTitle: "bookkeeper",
    home: "saltgate",
    roles: [["accounts", null]],
  },
} satisfies Record<string, Person>;

export type TestPerson = keyof typeof people;

/** Monday to Friday 08:00 to 16:00 with lunch at noon: Ana and Idris at Saltgate, Tomasz at Tollhouse Lane. */
const workplaces = {
  therapist: "saltgate",
  owningTherapist: "saltgate",
  otherTherapist: "tollhouse",
} as const;

export async function addStaff({ db, practiceId, clock }: PracticeBase, { sites }: TestSites) {
  const suffix = practiceId.slice(-12);
  const entries = Object.entries(people) as [TestPerson, Person][];
  const staff = Object.fromEntries(
    entries.map(([key, person], position) => {
      const member = {
        practiceId,
        id: newId(),
        givenName: person.givenName,
        familyName: person.familyName,
        jobTitle: person.jobTitle,
        registrationNumber: person.registrationNumber ?? null,
        isTherapist: person.roles.some(([role]) => role === "therapist"),
        homeSiteId: sites[person.home].id,
        position,
        createdAt: clock.now(),
      };
      const roles = person.roles.map(([role, at]) => ({ role, siteId: at === null ? null : sites[at].id }));
      return [key, { ...member, email: `${key.toLowerCase()}.${suffix}@marram.example`, roles }];
    }),
  ) as Record<TestPerson, TestStaffMember>;
  const members = Object.values(staff);
  await db.insert(staffMembers).values(members.map(({ email: _email, roles: _roles, ...member }) => member));
  await db.insert(staffAccounts).values(
    members.map(({ id, email }) => ({
      id: newId(),
      practiceId,
      staffMemberId: id,
      email,
      passwordHash: demoPasswordHash,
      passwordChangedAt: clock.now(),
    })),
  );
  await db
    .insert(staffRoles)
    .values(
      members.flatMap(({ id, roles }) =>
        roles.map((held) => ({ practiceId, id: newId(), staffMemberId: id, ...held })),
      ),
    );
  await db.insert(workingPatterns).values(
    Object.entries(workplaces).flatMap(([key, site]) =>
      [1, 2, 3, 4, 5].map((weekday) => ({
        practiceId,
        id: newId(),
        staffMemberId: staff[key as keyof typeof workplaces].id,
        siteId: sites[site].id,
        weekday,
        startsAt: "08:00",
        endsAt: "16:00",
        breaks: [{ startsAt: "12:00", endsAt: "13:00", label: "Lunch" }],
        validFrom: "2026-01-05",
      })),
    ),
  );
  return { staff };
}

export interface TestStaffMember {
  practiceId: string;
  id: string;
  givenName: string;
  familyName: string;
  jobTitle: string;
  registrationNumber: string | null;
  isTherapist: boolean;
  homeSiteId: string;
  position: number;
  createdAt: Date;
  email: string;
  roles: { role: Role; siteId: string | null }[];
}

export type TestStaff = Awaited<ReturnType<typeof addStaff>>;
