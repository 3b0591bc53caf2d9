import { isSameText } from "@withy/clinical/notes/note-text";
import type { NoteView, SavedNote, SaveNoteDraftInput, StaleNote } from "@withy/contracts/clinical";
import type { UnsentCopy } from "@/components/unsent-copy";

export type SaveState = "saved" | "typing" | "saving" | "kept-here" | "not-kept" | "clash";
export type Body = Readonly<Record<string, string>>;

export interface Clash {
  readonly theirs: StaleNote["theirs"];
  readonly mine: Body;
}

export interface DraftView {
  readonly body: Body;
  readonly state: SaveState;
  readonly savedAt: string;
  /** The note was changed somewhere else: both texts, until someone chooses. */
  readonly clash: Clash | null;
  /** Why it could not be saved, in the server's own sentence. */
  readonly failure: string | null;
  /** When the text that was found in this browser and brought back had been kept. */
  readonly broughtBack: string | null;
}

export interface KeeperPorts {
  save(input: SaveNoteDraftInput): Promise<SavedNote>;
  /** What a failed save means: the other text where it clashed, else a sentence. */
  explain(error: unknown): { theirs: StaleNote["theirs"] } | { sentence: string };
  copies: { read(): UnsentCopy | null; keep(copy: UnsentCopy): boolean; drop(): void };
}

/** Saved this long after the last key, and at least this often while someone writes on. */
export const idleMs = 2000;
export const longestMs = 10_000;
export const retryMs = 8000;

type Timer = ReturnType<typeof setTimeout>;

/**
 * Keeps the text that is being written: saves it by itself, one save at a time; keeps it in the browser where the
 * network fails and tries again; and never writes over someone else's text.
 */
export class NoteKeeper {
  private view: DraftView;
  private saved: Body;
  private seen: number;
  private running: Promise<boolean> | null = null;
  private isAbandoned = false;
  private readonly timers: {
    idle?: Timer | undefined;
    longest?: Timer | undefined;
    retry?: Timer | undefined;
  } = {};
  private readonly listeners = new Set<() => void>();

  constructor(
    private readonly note: Pick<NoteView, "id" | "kind" | "body" | "version" | "updatedAt">,
    private readonly ports: KeeperPorts,
  ) {
    this.saved = note.body;
    this.seen = note.version;
    this.view = {
      body: note.body,
      state: "saved",
      savedAt: note.updatedAt,
      clash: null,
      failure: null,
      broughtBack: null,
    };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };
  readonly current = (): DraftView => this.view;

  get version(): number {
    return this.seen;
  }

  /** Brings back what an earlier page could not send. */
  restore(): void {
    const copy = this.ports.copies.read();
    if (!copy) return;
    if (this.isSaved(copy.body)) {
      this.ports.copies.drop();
      return;
    }
    if (copy.version === this.seen) {
      this.show({ broughtBack: copy.keptAt });
      this.write(copy.body);
      return;
    }
    const theirs = { version: this.seen, body: this.saved, savedAt: this.note.updatedAt };
    this.show({ clash: { theirs, mine: copy.body }, state: "clash" });
  }

  change(key: string, text: string): void {
    this.write({ ...this.view.body, [key]: text });
  }

  /** Saves what is not saved yet. True once nothing is left. */
  async flush(): Promise<boolean> {
    this.stopTimers();
    // Again and again: of several that wait for one save, another may have begun the next.
    while (this.running) await this.running;
    if (this.view.clash) return false;
    if (this.isSaved(this.view.body)) {
      this.rest();
      return true;
    }
    this.running = this.send();
    const isDone = await this.running;
    this.running = null;
    return isDone && this.flush();
  }

  /** Ends a clash: the chosen text goes on from the other version. */
  settle(chosen: Body): void {
    const clash = this.view.clash;
    if (!clash) return;
    this.saved = clash.theirs.body;
    this.seen = clash.theirs.version;
    this.ports.copies.drop();
    this.show({ clash: null, body: chosen, state: this.isSaved(chosen) ? "saved" : "typing" });
    void this.flush();
  }

  /** The person signs out: what is not saved is given up, unless they stay and write on. */
  abandon(): void {
    this.stopTimers();
    this.isAbandoned = true;
    this.ports.copies.drop();
  }

  /** The page goes away: what is not saved yet stays in this browser. */
  leave(): void {
    if (this.isAbandoned) return;
    if (!this.isSaved(this.view.body)) this.keepHere();
    void this.flush();
  }

  /** All is as the server has it, though the last words were taken back by hand. */
  private rest(): void {
    if (this.view.state === "saved") return;
    this.ports.copies.drop();
    this.show({ state: "saved", failure: null });
  }

  private write(body: Body): void {
    this.isAbandoned = false;
    this.show({ body, state: this.view.clash ? "clash" : "typing" });
    clearTimeout(this.timers.idle);
    this.timers.idle = setTimeout(() => void this.flush(), idleMs);
    this.timers.longest ??= setTimeout(() => void this.flush(), longestMs);
  }

  private async send(): Promise<boolean> {
    const body = this.view.body;
    this.show({ state: "saving" });
    try {
      const saved = await this.ports.save({ noteId: this.note.id, version: this.seen, body: { ...body } });
      this.saved = body;
      this.seen = saved.version;
      this.ports.copies.drop();
      this.show({
        failure: null,
        savedAt: saved.savedAt,
        state: this.isSaved(this.view.body) ? "saved" : "typing",
      });
      return true;
    } catch (error) {
      this.fail(this.ports.explain(error));
      return false;
    }
  }

  private fail(why: ReturnType<KeeperPorts["explain"]>): void {
    const isKept = this.keepHere();
    if ("theirs" in why) {
      this.show({ clash: { theirs: why.theirs, mine: this.view.body }, state: "clash" });
      return;
    }
    this.show({ failure: why.sentence, state: isKept ? "kept-here" : "not-kept" });
    if (!this.isAbandoned) this.timers.retry = setTimeout(() => void this.flush(), retryMs);
  }

  private keepHere(): boolean {
    if (this.isAbandoned) return false;
    return this.ports.copies.keep({
      version: this.seen,
      body: this.view.body,
      keptAt: new Date().toISOString(),
    });
  }

  private isSaved(body: Body): boolean {
    return isSameText(this.note.kind, body, this.saved);
  }

  private stopTimers(): void {
    for (const timer of Object.values(this.timers)) clearTimeout(timer);
    this.timers.idle = undefined;
    this.timers.longest = undefined;
    this.timers.retry = undefined;
  }

  private show(change: Partial<DraftView>): void {
    this.view = { ...this.view, ...change };
    for (const listener of this.listeners) listener();
  }
}
