import { parseArgs } from "node:util";
import { systemClock } from "@withy/core/clock";
import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { connect } from "@withy/db/client";
import { foundPractice } from "./found-practice";

const { values } = parseArgs({
  options: {
    name: { type: "string", default: "" },
    site: { type: "string", default: "" },
    given: { type: "string", default: "" },
    family: { type: "string", default: "" },
    email: { type: "string", default: "" },
    prefix: { type: "string", default: "" },
  },
});

const connection = connect(process.env.DATABASE_URL ?? "", { connectionLimit: 1 });
try {
  const { token } = await foundPractice(
    { clock: systemClock, db: connection.db, requestId: newId() },
    {
      practiceName: values.name,
      siteName: values.site,
      ownerGivenName: values.given,
      ownerFamilyName: values.family,
      ownerEmail: values.email,
      invoicePrefix: values.prefix,
    },
  );
  console.log(`${process.env.NEXTAUTH_URL ?? ""}/invitation/${token}`);
} catch (error) {
  if (!isAppError(error)) throw error;
  for (const { field, message } of error.fields) console.error(`${field}: ${message}`);
  process.exitCode = 1;
} finally {
  await connection.close();
}
