import type { PatientDetails } from "@withy/contracts/patients";
import { refuseIf } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { gpPractices, sites, staffMembers } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { checkBirthDate } from "./check-birth-date";
import { searchColumns } from "./search-columns";

/** A patient's columns from checked input, every id in it looked up inside the practice. */
export async function patientColumns(tx: Context, input: PatientDetails, homeSiteId: string) {
  refuseIf(checkBirthDate(input.bornOn, dayOf(tx.clock.now(), tx.zone)));
  const site = await loadRecord(tx, sites, input.homeSiteId ?? homeSiteId, "site");
  if (input.gpPracticeId !== null) await loadRecord(tx, gpPractices, input.gpPracticeId, "GP surgery");
  if (input.usualTherapistId !== null)
    await loadRecord(tx, staffMembers, input.usualTherapistId, "therapist");
  return {
    givenName: input.givenName,
    familyName: input.familyName,
    preferredName: input.preferredName,
    bornOn: input.bornOn,
    sex: input.sex,
    phone: input.phone,
    email: input.email,
    addressLines: input.addressLines,
    postcode: input.postcode,
    nhsNumber: input.nhsNumber,
    gpPracticeId: input.gpPracticeId,
    gpName: input.gpName,
    communicationNeeds: input.communicationNeeds,
    preferredChannel: input.preferredChannel,
    nextOfKin: input.nextOfKin,
    homeSiteId: site.id,
    usualTherapistId: input.usualTherapistId,
    ...searchColumns(input),
  };
}
