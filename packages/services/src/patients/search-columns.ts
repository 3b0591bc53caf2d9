import { foldName } from "@withy/core/names";

interface Named {
  givenName: string;
  familyName: string;
  preferredName: string | null;
  phone: string | null;
}

const longest = 170;

/** The columns that the search reads, kept in step with every change of name or phone. */
export function searchColumns({ givenName, familyName, preferredName, phone }: Named) {
  const also = preferredName ? ` ${preferredName}` : "";
  return {
    nameLastFirst: foldName(`${familyName} ${givenName}${also}`).slice(0, longest),
    nameFirstLast: foldName(`${givenName} ${familyName}`).slice(0, longest),
    phoneReversed: phone === null ? null : reversedDigits(phone),
  };
}

/** The digits from the end, so that the last few that someone remembers are a prefix. */
export function reversedDigits(phone: string): string {
  return [...phone.replace(/\D/g, "")].reverse().join("");
}
