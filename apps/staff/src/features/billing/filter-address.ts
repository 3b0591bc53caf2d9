import { ageBuckets } from "@withy/billing/ageing";
import type { ListInvoicesInput } from "@withy/contracts/billing";
import { invoiceKinds } from "@withy/contracts/billing/invoice-kinds";
import type { InvoiceFilters } from "./api-client";

export interface FilterAddress {
  readonly kind: NonNullable<ListInvoicesInput["kind"]>;
  readonly age: ListInvoicesInput["age"];
  readonly payer: string | undefined;
  readonly siteId: string | undefined;
  readonly find: string | undefined;
  readonly page: number;
}

const oneOf = <T extends string>(list: readonly T[], text: string | null): T | undefined =>
  list.find((one) => one === text);

/** The filter that an address holds; parts that make no sense fall back to the usual list of who owes. */
export function readFilterAddress(query: URLSearchParams): FilterAddress {
  const page = Number(query.get("page") ?? "1");
  return {
    kind: oneOf(invoiceKinds, query.get("kind")) ?? "owed",
    age: oneOf(ageBuckets, query.get("age")),
    payer: query.get("payer") ?? undefined,
    siteId: query.get("site") ?? undefined,
    find: query.get("find") ?? undefined,
    page: Number.isInteger(page) && page > 0 ? page : 1,
  };
}

export function writeFilterAddress(filter: FilterAddress): string {
  const query = new URLSearchParams();
  if (filter.kind !== "owed") query.set("kind", filter.kind);
  if (filter.age !== undefined) query.set("age", filter.age);
  if (filter.payer !== undefined) query.set("payer", filter.payer);
  if (filter.siteId !== undefined) query.set("site", filter.siteId);
  if (filter.find !== undefined && filter.find !== "") query.set("find", filter.find);
  if (filter.page > 1) query.set("page", String(filter.page));
  const text = query.toString();
  return text === "" ? "/billing" : `/billing?${text}`;
}

/** The same as the verb wants it: parts that are not set are left out. */
export function toListInput({ kind, age, payer, siteId, find, page }: FilterAddress): InvoiceFilters {
  return {
    kind,
    page,
    ...(age === undefined ? {} : { age }),
    ...(payer === undefined ? {} : { payer }),
    ...(siteId === undefined ? {} : { siteId }),
    ...(find === undefined || find === "" ? {} : { find }),
  };
}
