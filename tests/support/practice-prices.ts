import { newId } from "@withy/core/ids";
import {
  gpPractices,
  invoiceCounters,
  payers,
  prices,
  products,
  services,
  serviceTherapists,
} from "@withy/db/schema";
import type { PracticeBase } from "./practice-base";
import type { TestSites } from "./practice-sites";
import type { TestStaff } from "./practice-staff";

/** Two services by every therapist, a band for sale, one insurer with its own price, one surgery. */
export async function addPriceList(
  { db, practiceId }: PracticeBase,
  _sites: TestSites,
  { staff }: TestStaff,
) {
  const initial = {
    practiceId,
    id: newId(),
    name: "Initial assessment",
    kind: "initial" as const,
    durationMinutes: 45,
    cleanDownMinutes: 5,
    position: 0,
  };
  const followUp = {
    practiceId,
    id: newId(),
    name: "Follow-up",
    kind: "follow-up" as const,
    durationMinutes: 30,
    cleanDownMinutes: 5,
    position: 1,
  };
  await db.insert(services).values([initial, followUp]);
  const therapists = [staff.therapist, staff.otherTherapist, staff.owningTherapist];
  await db
    .insert(serviceTherapists)
    .values(
      [initial, followUp].flatMap((service) =>
        therapists.map((member) => ({ practiceId, serviceId: service.id, staffMemberId: member.id })),
      ),
    );
  const band = { practiceId, id: newId(), name: "Resistance band", vatTreatment: "standard" as const };
  await db.insert(products).values(band);
  const insurer = {
    practiceId,
    id: newId(),
    name: "Kittiwake Health",
    kind: "insurer" as const,
    addressLines: ["1 Quay House", "Easterhaven"],
    postcode: "ZZ9 9ZZ",
    email: "claims@kittiwake.example",
  };
  await db.insert(payers).values(insurer);
  const surgery = {
    practiceId,
    id: newId(),
    name: "Lantern Street Surgery",
    addressLines: ["14 Lantern Street", "Easterhaven"],
    postcode: "ZZ3 1EF",
    email: "letters@lantern.example",
    phone: "+441632960200",
  };
  await db.insert(gpPractices).values(surgery);
  const price = (
    amountPence: number,
    what: { serviceId?: string; productId?: string; payerId?: string },
    vatTreatment: "exempt" | "standard" = "exempt",
  ) => ({
    practiceId,
    id: newId(),
    amountPence,
    vatTreatment,
    validFrom: "2026-01-01",
    ...what,
  });
  await db
    .insert(prices)
    .values([
      price(6800, { serviceId: initial.id }),
      price(5200, { serviceId: followUp.id }),
      price(6100, { serviceId: initial.id, payerId: insurer.id }),
      price(1250, { productId: band.id }, "standard"),
    ]);
  await db.insert(invoiceCounters).values({ practiceId, series: "invoice", nextNumber: 1 });
  return {
    services: { initial, followUp },
    products: { band },
    payers: { insurer },
    gpPractices: { surgery },
  };
}
