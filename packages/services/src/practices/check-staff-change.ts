import { type RoleHolding, sitesWith } from "@withy/core/access/can";
import { type Refusal, refusal } from "@withy/core/refusal";

/** Roles are given and taken only where one manages staff oneself: at a site, or everywhere. */
export function checkReachOfRoles(
  own: readonly RoleHolding[],
  roles: readonly RoleHolding[],
): Refusal | null {
  const managed = sitesWith(own, "staff.manage");
  if (managed === "all") return null;
  if (roles.every(({ siteId }) => siteId !== null && managed.includes(siteId))) return null;
  return refusal(
    "roles-beyond-reach",
    "You manage staff at your own sites only. Ask an owner of the whole practice to change this.",
    "roles",
  );
}

/** A practice without an owner could never be changed again. */
export function checkOwnerStays(otherOwners: number, staysOwner: boolean): Refusal | null {
  if (staysOwner || otherOwners > 0) return null;
  return refusal("last-owner", "This is the only owner. Make someone else an owner first.", "roles");
}
