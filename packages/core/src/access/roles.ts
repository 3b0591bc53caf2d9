import type { Permission } from "./permissions";

export const roles = ["owner", "therapist", "receptionist", "accounts"] as const;
export type Role = (typeof roles)[number];

const everyone: Permission[] = ["practice.read", "account.own"];

/**
 * Who may do what. An owner runs the practice but reads no clinical text unless also a therapist; a receptionist
 * books and takes money but sees no notes; accounts sees names and money only.
 */
export const rolePermissions: Record<Role, readonly Permission[]> = {
  owner: [
    ...everyone,
    "practice.manage",
    "staff.manage",
    "patients.read",
    "patients.register",
    "patients.edit",
    "diary.read",
    "diary.book",
    "diary.cancel",
    "diary.mark",
    "billing.read",
    "billing.draft",
    "billing.issue",
    "billing.take-payment",
    "billing.refund",
    "reports.read",
    "messaging.read",
    "messaging.send",
    "audit.read",
  ],
  therapist: [
    ...everyone,
    "patients.read",
    "patients.register",
    "patients.edit",
    "diary.read",
    "diary.book",
    "diary.cancel",
    "diary.mark",
    "clinical.read",
    "clinical.write",
    "clinical.sign",
    "letters.read",
    "letters.write",
    "letters.sign",
    "letters.send",
  ],
  receptionist: [
    ...everyone,
    "patients.read",
    "patients.register",
    "patients.edit",
    "diary.read",
    "diary.book",
    "diary.cancel",
    "diary.mark",
    "billing.read",
    "billing.draft",
    "billing.issue",
    "billing.take-payment",
    "messaging.read",
    "messaging.send",
  ],
  accounts: [
    ...everyone,
    "patients.read",
    "billing.read",
    "billing.draft",
    "billing.issue",
    "billing.take-payment",
    "billing.refund",
    "reports.read",
  ],
};
