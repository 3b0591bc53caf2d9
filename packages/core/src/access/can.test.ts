import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { can, type RoleHolding, sitesWith } from "./can";
import { type Permission, permissions } from "./permissions";
import { type Role, rolePermissions, roles } from "./roles";

// Who may do what stands as a table in tests/architecture; here is how holdings add up.
const sites = ["saltgate", "tollhouse", "upper-wharf"];
const holding = fc.record({
  role: fc.constantFrom(...roles),
  siteId: fc.option(fc.constantFrom(...sites)),
});
const held = fc.array(holding, { maxLength: 5 });
const permission = fc.constantFrom(...permissions);
const at = (role: Role, siteId: string | null = null): RoleHolding => ({ role, siteId });

describe("whether roles allow a permission", () => {
  it("nobody may do anything without a role", () => {
    expect(permissions.filter((p) => can([], p))).toEqual([]);
  });

  it("an owner runs the practice and reads no clinical text", () => {
    expect(can([at("owner")], "practice.manage", "saltgate")).toBe(true);
    expect(can([at("owner")], "clinical.read")).toBe(false);
    expect(can([at("owner"), at("therapist", "saltgate")], "clinical.read", "saltgate")).toBe(true);
    expect(can([at("owner"), at("therapist", "saltgate")], "clinical.read", "tollhouse")).toBe(false);
  });

  it.each<[string, RoleHolding[], string | undefined, boolean]>([
    ["held everywhere, asked anywhere", [at("receptionist")], undefined, true],
    ["held everywhere, asked at a site", [at("receptionist")], "tollhouse", true],
    ["held at a site, asked there", [at("receptionist", "saltgate")], "saltgate", true],
    ["held at a site, asked elsewhere", [at("receptionist", "saltgate")], "tollhouse", false],
    ["held at a site, asked anywhere", [at("receptionist", "saltgate")], undefined, true],
    [
      "another role at the site asked for",
      [at("receptionist", "saltgate"), at("accounts", "tollhouse")],
      "tollhouse",
      false,
    ],
    ["no site has an empty name", [at("receptionist", "saltgate")], "", false],
  ])("%s", (_, holdings, siteId, answer) => expect(can(holdings, "diary.book", siteId)).toBe(answer));

  it("one role more takes nothing away", () => {
    fc.assert(
      fc.property(
        held,
        holding,
        permission,
        fc.option(fc.constantFrom(...sites)),
        (has, more, asked, site) => {
          const where = site ?? undefined;
          fc.pre(can(has, asked, where));
          expect(can([more, ...has], asked, where)).toBe(true);
        },
      ),
    );
  });
});

describe("what is unknown means no", () => {
  // A row or a request may hold a word that the code no longer knows, or one that every object knows.
  const words = ["", "admin", "OWNER", "owner ", "constructor", "toString", "__proto__", "hasOwnProperty"];

  it.each(words)("the role %j", (word) => {
    const stranger = [{ role: word as Role, siteId: null }];
    expect(permissions.filter((p) => can(stranger, p))).toEqual([]);
    expect(sitesWith(stranger, "practice.read")).toEqual([]);
  });

  it.each([...words, "clinical", "clinical.", "clinical.*", "*"])("the permission %j", (word) => {
    const everything = roles.map((role) => at(role));
    expect(can(everything, word as Permission)).toBe(false);
    expect(sitesWith(everything, word as Permission)).toEqual([]);
  });

  it("a stranger beside a known role leaves it its own", () => {
    const both = [{ role: "constructor" as Role, siteId: null }, at("accounts", "saltgate")];
    expect(can(both, "reports.read", "saltgate")).toBe(true);
  });
});

describe("the sites where roles allow a permission", () => {
  it("are all of them where one role is held everywhere", () => {
    expect(sitesWith([at("receptionist", "saltgate"), at("owner")], "diary.book")).toBe("all");
    expect(sitesWith([at("receptionist", "saltgate"), at("accounts")], "diary.book")).toEqual(["saltgate"]);
  });

  it("are named once each", () => {
    const holdings = [
      at("receptionist", "saltgate"),
      at("therapist", "saltgate"),
      at("therapist", "tollhouse"),
    ];
    expect(sitesWith(holdings, "diary.book")).toEqual(["saltgate", "tollhouse"]);
  });

  it("are those where the permission is given, and none other", () => {
    fc.assert(
      fc.property(held, permission, (holdings, asked) => {
        const reach = sitesWith(holdings, asked);
        const given = sites.filter((site) => can(holdings, asked, site));
        expect(reach === "all" ? sites : [...reach].sort()).toEqual(given);
        expect(can(holdings, asked)).toBe(reach === "all" || reach.length > 0);
      }),
    );
  });
});

it("a role names each of its permissions once", () => {
  for (const role of roles) expect(new Set(rolePermissions[role]).size).toBe(rolePermissions[role].length);
});
