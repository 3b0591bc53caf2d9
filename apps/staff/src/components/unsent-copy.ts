/** What could not be sent, kept in this browser until it is saved; nothing is kept while saving works. */
export interface UnsentCopy {
  readonly version: number;
  readonly body: Readonly<Record<string, string>>;
  readonly keptAt: string;
}

/** Whose text it is and of which note: on a shared browser nobody is shown what a colleague wrote. */
export interface CopyPlace {
  readonly personId: string;
  readonly noteId: string;
}

const prefix = "withy.unsent-note.";
const keyOf = ({ personId, noteId }: CopyPlace) => `${prefix}${personId}.${noteId}`;

function isCopy(value: unknown): value is UnsentCopy {
  if (typeof value !== "object" || value === null) return false;
  const { version, body, keptAt } = value as Record<string, unknown>;
  return (
    typeof version === "number" && typeof body === "object" && body !== null && typeof keptAt === "string"
  );
}

export function readCopy(place: CopyPlace): UnsentCopy | null {
  try {
    const value: unknown = JSON.parse(window.localStorage.getItem(keyOf(place)) ?? "null");
    return isCopy(value) ? value : null;
  } catch {
    return null;
  }
}

/** False where the browser has no room or no storage, so that the screen can say so. */
export function keepCopy(place: CopyPlace, copy: UnsentCopy): boolean {
  try {
    window.localStorage.setItem(keyOf(place), JSON.stringify(copy));
    return true;
  } catch {
    return false;
  }
}

export function dropCopy(place: CopyPlace): void {
  drop((key) => key === keyOf(place));
}

/** Everyone's: whoever uses this browser next finds nothing. */
export function dropAllCopies(): void {
  drop((key) => key.startsWith(prefix));
}

export function hasCopies(personId: string): boolean {
  return keys().some((key) => key.startsWith(`${prefix}${personId}.`));
}

function drop(isMeant: (key: string) => boolean): void {
  for (const key of keys().filter(isMeant)) window.localStorage.removeItem(key);
}

function keys(): string[] {
  try {
    return Object.keys(window.localStorage);
  } catch {
    // Without storage there are no copies.
    return [];
  }
}
