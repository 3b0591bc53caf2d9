import { addDays } from "@withy/core/zoned-time";
import {
  gpPractices,
  invoiceCounters,
  payers,
  practices,
  prices,
  products,
  rooms,
  services,
  serviceTherapists,
  siteHours,
  sites,
} from "../schema";
import { addPeople } from "./add-people";
import { payersOfMarram, surgeries } from "./scenario/places";
import type { PracticePlan, SitePlan } from "./scenario/practice-plan";
import type { House, PersonRow, ServiceRow, SiteRow, Stage } from "./stage";

const openedDays = 900;

/** Writes a practice with its sites, rooms, people, services and prices. */
export function addHouse(stage: Stage, plan: PracticePlan): House {
  const { rows, newId } = stage;
  const practiceId = newId();
  const createdAt = new Date(stage.now.getTime() - openedDays * 86_400_000);
  const practice: typeof practices.$inferInsert = {
    id: practiceId,
    name: plan.name,
    legalName: plan.legalName,
    addressLines: [...plan.lines],
    postcode: plan.postcode,
    phone: plan.phone,
    email: plan.email,
    zone: stage.zone,
    vatNumber: plan.vatNumber,
    invoicePrefix: plan.invoicePrefix,
    utilisationTarget: plan.utilisationTarget,
    createdAt,
  };
  rows.add(practices, practice);
  const siteRows = new Map(
    plan.sites.map((site, position) => [site.key, addSite(stage, practiceId, site, position, createdAt)]),
  );
  const people = addPeople(stage, { practiceId, plan, sites: siteRows, createdAt });
  const therapists = people.filter((person) => person.isTherapist);
  const shared = { practice, practiceId, plan, sites: siteRows, people, therapists };
  const desk = people.filter((person) => person.plan.roles.some(([role]) => role === "receptionist"));
  return {
    ...shared,
    desk,
    ...addTrade(stage, practiceId, plan, therapists),
    surgeries: addSurgeries(stage, practiceId),
  };
}

function addSite(
  { rows, newId }: Stage,
  practiceId: string,
  plan: SitePlan,
  position: number,
  createdAt: Date,
): SiteRow {
  const site = {
    practiceId,
    id: newId(),
    name: plan.name,
    addressLines: [...plan.lines],
    postcode: plan.postcode,
    phone: plan.phone,
    isStepFree: plan.isStepFree,
    position,
    createdAt,
  };
  rows.add(sites, site);
  const hours = [1, 2, 3, 4, 5].map((weekday) => ({
    weekday,
    opensAt: plan.opensAt,
    closesAt: plan.closesAt,
  }));
  const all = plan.saturday ? [...hours, { weekday: 6, ...plan.saturday }] : hours;
  rows.add(siteHours, ...all.map((row) => ({ practiceId, siteId: site.id, ...row })));
  const names = [
    ...plan.rooms.map((name) => ({ name, kind: "treatment" as const })),
    ...(plan.gym ? [{ name: plan.gym, kind: "gym" as const }] : []),
  ];
  const roomRows = names.map(({ name, kind }, at) => ({
    practiceId,
    id: newId(),
    siteId: site.id,
    name,
    kind,
    position: at,
  }));
  rows.add(rooms, ...roomRows);
  return {
    ...site,
    plan,
    treatmentRooms: roomRows.filter((room) => room.kind === "treatment"),
    gymRooms: roomRows.filter((room) => room.kind === "gym"),
  };
}

function addTrade(stage: Stage, practiceId: string, plan: PracticePlan, therapists: readonly PersonRow[]) {
  const { rows, newId, today } = stage;
  const entries = plan.services.map((service, position): [string, ServiceRow] => [
    service.key,
    {
      practiceId,
      id: newId(),
      name: service.name,
      kind: service.kind,
      durationMinutes: service.minutes,
      cleanDownMinutes: service.cleanDown,
      roomKind: service.room,
      position,
    },
  ]);
  const serviceRows = Object.fromEntries(entries);
  rows.add(services, ...Object.values(serviceRows));
  for (const [key, service] of entries) {
    const givers = therapists.filter((person) =>
      key === "gym" ? person.plan.isGymOnly : !person.plan.isGymOnly,
    );
    rows.add(
      serviceTherapists,
      ...givers.map(({ id }) => ({ practiceId, serviceId: service.id, staffMemberId: id })),
    );
  }
  const productRows = plan.products.map(({ name }) => ({
    practiceId,
    id: newId(),
    name,
    vatTreatment: "standard" as const,
  }));
  rows.add(products, ...productRows);
  const payerRows = payersOfMarram.map((payer) => ({
    practiceId,
    id: newId(),
    name: payer.name,
    kind: payer.kind,
    addressLines: [...payer.lines],
    postcode: payer.postcode,
    email: payer.email,
    paymentDays: payer.days,
  }));
  rows.add(payers, ...payerRows);
  const validFrom = addDays(today, -400);
  const base = { practiceId, validFrom };
  const priceRows: (typeof prices.$inferInsert)[] = [
    ...plan.services.map(({ key, pence }) => ({
      ...base,
      id: newId(),
      serviceId: serviceRows[key]?.id ?? null,
      amountPence: pence,
      vatTreatment: "exempt" as const,
    })),
    ...plan.services.flatMap(({ key, pence }) =>
      payerRows.map((payer) => ({
        ...base,
        id: newId(),
        serviceId: serviceRows[key]?.id ?? null,
        payerId: payer.id,
        amountPence: Math.round((pence * plan.payerDiscount) / 100) * 100,
        vatTreatment: "exempt" as const,
      })),
    ),
    ...plan.products.map(({ pence }, i) => ({
      ...base,
      id: newId(),
      productId: productRows[i]?.id ?? null,
      amountPence: pence,
      vatTreatment: "standard" as const,
    })),
  ];
  rows.add(prices, ...priceRows);
  rows.add(invoiceCounters, { practiceId, series: "invoice", nextNumber: 1 });
  return { services: serviceRows, products: productRows, payers: payerRows, prices: priceRows };
}

function addSurgeries({ rows, newId }: Stage, practiceId: string) {
  return surgeries.map((surgery, i) => {
    const row = {
      practiceId,
      id: newId(),
      name: surgery.name,
      addressLines: [...surgery.lines],
      postcode: surgery.postcode,
      phone: `+4416329602${String(i + 10).padStart(2, "0")}`,
      email: `letters${i + 1}@surgery.example`,
    };
    rows.add(gpPractices, row);
    return { row, doctors: surgery.doctors };
  });
}
