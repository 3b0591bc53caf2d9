import { can } from "@withy/core/access/can";
import { isId } from "@withy/core/ids";
import { listSites } from "@withy/services/practices";
import type { Metadata } from "next";
import { OpenEpisodeForm } from "@/features/clinical/components/open-episode-form";
import { requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Open an episode" };

export default async function OpenEpisodePage({
  params,
  searchParams,
}: PageProps<"/patients/[patientId]/episodes/new">) {
  const context = await requireContext("clinical.write");
  const [{ patientId }, { visit }] = await Promise.all([params, searchParams]);
  const sites = (await listSites(context, {})).filter((site) =>
    can(context.roles, "clinical.write", site.id),
  );
  return (
    <OpenEpisodeForm
      patientId={patientId}
      sites={sites.map(({ id, name }) => ({ id, name }))}
      deskSiteId={context.deskSiteId}
      visitId={isId(visit) ? String(visit) : null}
    />
  );
}
