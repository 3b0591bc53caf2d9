import { can } from "@withy/core/access/can";
import { permissions } from "@withy/core/access/permissions";
import { roles } from "@withy/core/access/roles";
import { expect, test } from "vitest";

/** Who may do what, as the practice was promised it. A change of rights is a change of this table too. */
const promised = `
                        owner  therapist  receptionist  accounts
practice.read           yes    yes        yes           yes
practice.manage         yes    -          -             -
staff.manage            yes    -          -             -
patients.read           yes    yes        yes           yes
patients.register       yes    yes        yes           -
patients.edit           yes    yes        yes           -
diary.read              yes    yes        yes           -
diary.book              yes    yes        yes           -
diary.cancel            yes    yes        yes           -
diary.mark              yes    yes        yes           -
clinical.read           -      yes        -             -
clinical.write          -      yes        -             -
clinical.sign           -      yes        -             -
letters.read            -      yes        -             -
letters.write           -      yes        -             -
letters.sign            -      yes        -             -
letters.send            -      yes        -             -
billing.read            yes    -          yes           yes
billing.draft           yes    -          yes           yes
billing.issue           yes    -          yes           yes
billing.take-payment    yes    -          yes           yes
billing.refund          yes    -          -             yes
reports.read            yes    -          -             yes
messaging.read          yes    -          yes           -
messaging.send          yes    -          yes           -
audit.read              yes    -          -             -
account.own             yes    yes        yes           yes
`;

const [, ...rows] = promised.trim().split("\n");
const cells = rows.map((row) => row.trim().split(/\s+/));

test("the promised table covers every permission", () => {
  expect(cells.map(([permission]) => permission)).toEqual([...permissions]);
});

test.each(cells)("%s", (permission, ...answers) => {
  const held = roles.map((role) =>
    can([{ role, siteId: null }], permission as (typeof permissions)[number]) ? "yes" : "-",
  );
  expect(held).toEqual(answers);
});

test("a role held at one site gives nothing at another", () => {
  const holdings = [{ role: "receptionist" as const, siteId: "saltgate" }];
  expect(can(holdings, "diary.book", "saltgate")).toBe(true);
  expect(can(holdings, "diary.book", "upper-wharf")).toBe(false);
});
