import { can } from "@withy/core/access/can";
import { permissions } from "@withy/core/access/permissions";
import { headCounts, listSites } from "@withy/services/practices";
import type { ReactNode } from "react";
import { Providers } from "@/components/providers";
import { Shell } from "@/components/shell";
import { requireSession } from "@/server/context";

export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const { context, jobTitle, practiceName } = await requireSession();
  const [sites, counts] = await Promise.all([listSites(context, {}), headCounts(context, {})]);
  return (
    <Providers personId={context.staffMemberId}>
      <Shell
        name={context.staffName}
        jobTitle={jobTitle}
        practiceName={practiceName}
        deskSiteId={context.deskSiteId}
        sites={sites.map((s) => ({ id: s.id, name: s.name }))}
        permissions={permissions.filter((p) => can(context.roles, p))}
        counts={counts}
      >
        {children}
      </Shell>
    </Providers>
  );
}
