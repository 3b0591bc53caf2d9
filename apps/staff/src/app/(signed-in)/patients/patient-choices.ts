import "server-only";
import { dayOf } from "@withy/core/zoned-time";
import type { Context } from "@withy/services/context";
import { listPayers } from "@withy/services/patients";
import { listSites, listTherapists } from "@withy/services/practices";
import type { PatientChoices } from "@/features/patients/components/fields-props";

/** The short lists behind the patient form. */
export async function patientChoices(ctx: Context): Promise<PatientChoices> {
  const [sites, therapists, payers] = await Promise.all([
    listSites(ctx, {}),
    listTherapists(ctx, {}),
    listPayers(ctx, {}),
  ]);
  return {
    today: dayOf(ctx.clock.now(), ctx.zone),
    zone: ctx.zone,
    sites: sites.map(({ id, name }) => ({ id, name })),
    therapists: therapists.map(({ id, name }) => ({ id, name })),
    payers,
  };
}
