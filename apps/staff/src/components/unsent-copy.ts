/** What could not be sent, kept in this browser until it is saved; nothing is kept while saving works. */
export interface UnsentCopy {
  readonly version: number;
  readonly body: Readonly<Record<string, string>>;
  readonly keptAt: string;
}

const keyOf = (noteId: string) => `withy.unsent-note.${noteId}`;

function isCopy(value: unknown): value is UnsentCopy {
  if (typeof value !== "object" || value === null) return false;
  const { version, body, keptAt } = value as Record<string, unknown>;
  return (
    typeof version === "number" && typeof body === "object" && body !== null && typeof keptAt === "string"
  );
}

export function readCopy(noteId: string): UnsentCopy | null {
  try {
    const value: unknown = JSON.parse(window.localStorage.getItem(keyOf(noteId)) ?? "null");
    return isCopy(value) ? value : null;
  } catch {
    return null;
  }
}

/** False where the browser has no room or no storage, so that the screen can say so. */
export function keepCopy(noteId: string, copy: UnsentCopy): boolean {
  try {
    window.localStorage.setItem(keyOf(noteId), JSON.stringify(copy));
    return true;
  } catch {
    return false;
  }
}

export function dropCopy(noteId: string): void {
  try {
    window.localStorage.removeItem(keyOf(noteId));
  } catch {
    // Without storage there was no copy to drop.
  }
}
