import { emptyProgramme } from "@withy/clinical/programmes/new-item";
import { z } from "zod";
import type { RowBook } from "./row-book";

interface Schema {
  type?: string | string[];
  format?: string;
  const?: unknown;
  enum?: unknown[];
  anyOf?: Schema[];
  oneOf?: Schema[];
  properties?: Record<string, Schema>;
  items?: Schema;
  minItems?: number;
  minimum?: number;
  exclusiveMinimum?: number;
  default?: unknown;
}

/** What a shape alone cannot say: values that the input's own rules accept. Undefined leaves the property out. */
const known: Readonly<Record<string, unknown>> = {
  startsAt: "2026-12-08T10:15",
  endsAt: "2026-12-08T16:00",
  day: "2026-12-08",
  firstDay: "2026-12-08",
  startTime: "10:15",
  changes: [],
  from: undefined,
  until: undefined,
  month: "2026-11",
  bornOn: "1971-05-14",
  region: "hip",
  side: "left",
  measureKey: "pain-rating",
  entry: { form: "items", answers: [3] },
  takenOn: undefined,
  email: "someone@post.example",
  phone: null,
  hasNoPhone: true,
  postcode: "ZZ1 1AA",
  nhsNumber: null,
  odsCode: null,
  registrationNumber: null,
  currentPassword: "not the password",
  password: "four plain words here",
  content: emptyProgramme,
  key: "bridge",
  before: undefined,
  referredOn: undefined,
  earliestOn: undefined,
  latestOn: undefined,
  fromTime: undefined,
  untilTime: undefined,
  addressLines: ["1 Long Street"],
  sections: [],
  answers: {},
  body: {},
  overrideReason: null,
  durationMinutes: 30,
  communicationNeeds: null,
  preferredName: null,
  amountPence: 100,
  order: undefined,
  windows: undefined,
  equipment: undefined,
  cursor: undefined,
};

/** Where in an input ids stand: "patientId", "roles.siteId". */
export interface IdPlace {
  readonly path: readonly string[];
  readonly name: string;
}

const branches = (schema: Schema): Schema[] => schema.anyOf ?? schema.oneOf ?? [];
const isId = (schema: Schema): boolean => schema.format === "uuid" || branches(schema).some(isId);

/** An input that names the given rows wherever it can name one, and the places where it does. */
export function sampleInput(
  input: z.ZodType,
  rows: RowBook,
): { sample: Record<string, unknown>; places: IdPlace[] } {
  const places: IdPlace[] = [];
  const schema = z.toJSONSchema(input, { io: "input", unrepresentable: "any" }) as Schema;
  return { sample: objectOf(schema, rows, [], places), places };
}

function objectOf(
  schema: Schema,
  rows: RowBook,
  path: readonly string[],
  places: IdPlace[],
): Record<string, unknown> {
  const entries = Object.entries(schema.properties ?? {}).map(
    ([name, property]) => [name, valueFor(name, property, rows, [...path, name], places)] as const,
  );
  return Object.fromEntries(entries.filter(([, value]) => value !== undefined));
}

function valueFor(
  name: string,
  schema: Schema,
  rows: RowBook,
  path: readonly string[],
  places: IdPlace[],
): unknown {
  if (isId(schema)) {
    const id = rows[name];
    if (id === undefined) throw new Error(`The row book has no row for ${name}. Add one.`);
    places.push({ path, name });
    return id;
  }
  if (name in known) return known[name];
  if (schema.enum) return schema.enum[0];
  if (schema.const !== undefined) return schema.const;
  const usable = branches(schema).filter((branch) => branch.type !== "null" && branch.const === undefined);
  const [branch] = usable;
  if (branch) return valueFor(name, branch, rows, path, places);
  const type = Array.isArray(schema.type) ? schema.type[0] : schema.type;
  if (type === "object") return objectOf(schema, rows, path, places);
  if (type === "array")
    return schema.items ? [valueFor(name, schema.items, rows, [...path, "0"], places)] : [];
  if (type === "integer" || type === "number") return Math.max(1, schema.minimum ?? 1);
  if (type === "boolean") return false;
  return "Some words";
}

/** The same input with another id in one place. */
export function withId(
  sample: Record<string, unknown>,
  path: readonly string[],
  id: string,
): Record<string, unknown> {
  const copy = structuredClone(sample);
  let at: Record<string, unknown> = copy;
  for (const step of path.slice(0, -1)) at = at[step] as Record<string, unknown>;
  const last = path.at(-1);
  if (last !== undefined) at[last] = id;
  return copy;
}
