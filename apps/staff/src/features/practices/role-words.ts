import type { Role } from "@withy/core/access/roles";

export const roleWords: Record<Role, string> = {
  owner: "Owner",
  therapist: "Therapist",
  receptionist: "Receptionist",
  accounts: "Accounts",
};

export interface Held {
  role: Role;
  siteId: string | null;
}

/** "Owner everywhere, therapist at Saltgate". */
export function heldWords(roles: readonly Held[], sites: readonly { id: string; name: string }[]): string {
  if (roles.length === 0) return "none";
  return roles
    .map(({ role, siteId }) => {
      const site = sites.find((s) => s.id === siteId);
      return `${roleWords[role]}${siteId === null ? " everywhere" : ` at ${site?.name ?? "a closed site"}`}`;
    })
    .join(", ");
}
