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

/** "Owner everywhere, Therapist at Saltgate and Tollhouse Lane". */
export function heldWords(roles: readonly Held[], sites: readonly { id: string; name: string }[]): string {
  if (roles.length === 0) return "none";
  return [...new Set(roles.map(({ role }) => role))]
    .map((role) => {
      const held = roles.filter((one) => one.role === role);
      if (held.some(({ siteId }) => siteId === null)) return `${roleWords[role]} everywhere`;
      const names = sites
        .filter(({ id }) => held.some(({ siteId }) => siteId === id))
        .map(({ name }) => name);
      return `${roleWords[role]} at ${names.join(" and ")}`;
    })
    .join(", ");
}
