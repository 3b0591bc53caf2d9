import {
  getPracticeSettingsInput,
  type PatternSettings,
  type PracticeSettingsView,
  type ServiceSettings,
  type SiteSettings,
} from "@withy/contracts/practices";
import { notFound } from "@withy/core/errors";
import { formatPhone } from "@withy/core/identifiers/phone";
import { dayOf } from "@withy/core/zoned-time";
import {
  payers,
  practices,
  prices,
  rooms,
  services,
  siteHours,
  sites,
  staffMembers,
  workingPatterns,
} from "@withy/db/schema";
import { and, asc, eq, gte, isNull, lte, or } from "drizzle-orm";
import type { Context } from "../context";
import { verb } from "../verb";

/** How the practice is set up today: sites, rooms, services with their prices, working patterns. */
export const getPracticeSettings = verb(
  "practice.manage",
  getPracticeSettingsInput,
  async (ctx): Promise<PracticeSettingsView> => {
    const [practice] = await ctx.db.select().from(practices).where(eq(practices.id, ctx.practiceId)).limit(1);
    if (!practice) throw notFound("practice");
    const today = dayOf(ctx.clock.now(), ctx.zone);
    const [siteRows, serviceRows, patternRows] = await Promise.all([
      listSiteSettings(ctx),
      listServiceSettings(ctx, today),
      listPatterns(ctx, today),
    ]);
    return {
      name: practice.name,
      legalName: practice.legalName,
      vatNumber: practice.vatNumber,
      noticeHours: practice.noticeHours,
      utilisationTarget: practice.utilisationTarget,
      paymentDays: practice.paymentDays,
      sites: siteRows,
      services: serviceRows,
      patterns: patternRows,
    };
  },
);

async function listSiteSettings(ctx: Context): Promise<SiteSettings[]> {
  const [siteRows, hourRows, roomRows] = await Promise.all([
    ctx.db.select().from(sites).where(eq(sites.practiceId, ctx.practiceId)).orderBy(asc(sites.position)),
    ctx.db
      .select()
      .from(siteHours)
      .where(eq(siteHours.practiceId, ctx.practiceId))
      .orderBy(asc(siteHours.weekday)),
    ctx.db.select().from(rooms).where(eq(rooms.practiceId, ctx.practiceId)).orderBy(asc(rooms.position)),
  ]);
  return siteRows.map((site) => ({
    id: site.id,
    name: site.name,
    addressLines: site.addressLines,
    postcode: site.postcode,
    phone: site.phone === "" ? "" : formatPhone(site.phone),
    isStepFree: site.isStepFree,
    hours: hourRows
      .filter((row) => row.siteId === site.id)
      .map(({ weekday, opensAt, closesAt }) => ({ weekday, opensAt, closesAt })),
    rooms: roomRows.filter((row) => row.siteId === site.id).map(({ id, name, kind }) => ({ id, name, kind })),
  }));
}

async function listServiceSettings(ctx: Context, today: string): Promise<ServiceSettings[]> {
  const [serviceRows, priceRows] = await Promise.all([
    ctx.db
      .select()
      .from(services)
      .where(eq(services.practiceId, ctx.practiceId))
      .orderBy(asc(services.position)),
    ctx.db
      .select({ price: prices, siteName: sites.name, payerName: payers.name })
      .from(prices)
      .leftJoin(sites, and(eq(sites.practiceId, prices.practiceId), eq(sites.id, prices.siteId)))
      .leftJoin(payers, and(eq(payers.practiceId, prices.practiceId), eq(payers.id, prices.payerId)))
      .where(
        and(
          eq(prices.practiceId, ctx.practiceId),
          lte(prices.validFrom, today),
          or(isNull(prices.validUntil), gte(prices.validUntil, today)),
        ),
      )
      .orderBy(asc(prices.validFrom)),
  ]);
  return serviceRows.map((service) => ({
    id: service.id,
    name: service.name,
    durationMinutes: service.durationMinutes,
    cleanDownMinutes: service.cleanDownMinutes,
    isActive: service.isActive,
    prices: priceRows
      .filter(({ price }) => price.serviceId === service.id)
      .map(({ price, siteName, payerName }) => ({
        id: price.id,
        amountPence: price.amountPence,
        siteName,
        payerName,
        vatTreatment: price.vatTreatment,
      })),
  }));
}

async function listPatterns(ctx: Context, today: string): Promise<PatternSettings[]> {
  const rows = await ctx.db
    .select({
      pattern: workingPatterns,
      siteName: sites.name,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
    })
    .from(workingPatterns)
    .innerJoin(
      sites,
      and(eq(sites.practiceId, workingPatterns.practiceId), eq(sites.id, workingPatterns.siteId)),
    )
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, workingPatterns.practiceId),
        eq(staffMembers.id, workingPatterns.staffMemberId),
      ),
    )
    .where(
      and(
        eq(workingPatterns.practiceId, ctx.practiceId),
        or(isNull(workingPatterns.validUntil), gte(workingPatterns.validUntil, today)),
      ),
    )
    .orderBy(asc(staffMembers.position), asc(workingPatterns.weekday), asc(workingPatterns.startsAt));
  return rows.map(({ pattern, siteName, givenName, familyName }) => ({
    id: pattern.id,
    therapistName: `${givenName} ${familyName}`,
    siteName,
    weekday: pattern.weekday,
    startsAt: pattern.startsAt,
    endsAt: pattern.endsAt,
    breaks: pattern.breaks,
    everyWeeks: pattern.everyWeeks,
    validUntil: pattern.validUntil,
  }));
}
