import "@/features/patients/patients.css";
import { can } from "@withy/core/access/can";
import { listPatients } from "@withy/services/patients";
import { ButtonLink } from "@withy/ui/button";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import Link from "next/link";
import { PatientList } from "@/features/patients/components/patient-list";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Patients" };

export default async function PatientsPage({ searchParams }: PageProps<"/patients">) {
  const ctx = await requireContext("patients.read");
  const query = await searchParams;
  const mayRegister = can(ctx.roles, "patients.register");
  const search = typeof query["search"] === "string" ? query["search"] : "";
  const page = Math.max(1, Math.floor(Number(query["page"])) || 1);
  const first = await orNotFound(listPatients(ctx, { search: search.slice(0, 100), page, withTotal: true }));
  return (
    <Page>
      <PageTitle
        title="Patients"
        actions={
          mayRegister && (
            <ButtonLink kind="primary" size="small" href="/patients/new" as={Link}>
              Register a patient
            </ButtonLink>
          )
        }
      />
      <PageBody className="plist">
        <PatientList search={search} first={first} mayRegister={mayRegister} />
      </PageBody>
    </Page>
  );
}
