"use client";
import { roles } from "@withy/core/access/roles";
import { Check } from "@withy/ui/check";
import { FieldGroup } from "@withy/ui/field-group";
import { type Held, roleWords } from "../role-words";

interface Props {
  id: string;
  value: readonly Held[];
  onChange: (roles: Held[]) => void;
  sites: readonly { id: string; name: string }[];
  error?: string | undefined;
}

const isSame = (a: Held, b: Held) => a.role === b.role && a.siteId === b.siteId;

/** Which roles, and where: a table of ticks with a row for each role. */
export function RoleFields({ id, value, onChange, sites, error }: Props) {
  const places = [{ id: null, name: "Everywhere" }, ...sites];
  const toggle = (held: Held) =>
    onChange(value.some((v) => isSame(v, held)) ? value.filter((v) => !isSame(v, held)) : [...value, held]);
  return (
    <FieldGroup
      id={id}
      legend="Roles"
      error={error}
      hint="A role everywhere includes every site, also new ones"
    >
      <div className="rolegrid">
        {roles.map((role, row) => (
          <fieldset key={role}>
            <legend>{roleWords[role]}</legend>
            {places.map((place, column) => (
              <Check
                key={place.id ?? "all"}
                id={row === 0 && column === 0 ? id : undefined}
                checked={value.some((v) => isSame(v, { role, siteId: place.id }))}
                onChange={() => toggle({ role, siteId: place.id })}
              >
                {place.name}
              </Check>
            ))}
          </fieldset>
        ))}
      </div>
    </FieldGroup>
  );
}
