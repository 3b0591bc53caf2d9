import type { PatientRow } from "@withy/contracts/patients";
import { formatPhone } from "@withy/core/identifiers/phone";
import { patients } from "@withy/db/schema";

/** What a list of patients reads of each. */
export const rowColumns = {
  id: patients.id,
  givenName: patients.givenName,
  familyName: patients.familyName,
  preferredName: patients.preferredName,
  bornOn: patients.bornOn,
  phone: patients.phone,
  postcode: patients.postcode,
};

type Row = Pick<typeof patients.$inferSelect, keyof typeof rowColumns>;

export function toPatientRow(row: Row): PatientRow {
  return {
    id: row.id,
    name: `${row.givenName} ${row.familyName}`,
    preferredName: row.preferredName,
    bornOn: row.bornOn,
    phone: row.phone === null ? null : formatPhone(row.phone),
    postcode: row.postcode,
  };
}
