import "@/features/patients/patients.css";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { RegisterForm } from "@/features/patients/components/register-form";
import { requireContext } from "@/server/context";
import { patientChoices } from "../patient-choices";

export const metadata: Metadata = { title: "Register a patient" };

export default async function NewPatientPage({ searchParams }: PageProps<"/patients/new">) {
  const ctx = await requireContext("patients.register");
  const query = await searchParams;
  const typed = typeof query["name"] === "string" ? query["name"].trim() : "";
  const [givenName = "", ...rest] = typed.split(/\s+/);
  return (
    <Page>
      <PageTitle
        title="Register a patient"
        lead="Names, date of birth and one way to reach them are enough to begin."
      />
      <PageBody>
        <RegisterForm
          choices={await patientChoices(ctx)}
          deskSiteId={ctx.deskSiteId}
          name={{ givenName, familyName: rest.join(" ") }}
        />
      </PageBody>
    </Page>
  );
}
