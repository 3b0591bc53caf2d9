import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { UnsentCopy } from "@/components/unsent-copy";
import { idleMs, type KeeperPorts, longestMs, NoteKeeper, retryMs } from "./note-keeper";

const note = {
  id: "n1",
  kind: "session",
  body: {},
  version: 1,
  updatedAt: "2026-12-01T10:15:00.000Z",
} as const;

function ports(save: KeeperPorts["save"], kept: UnsentCopy | null = null) {
  const store = { copy: kept };
  const made: KeeperPorts = {
    save: vi.fn(save),
    explain: (error) => (error instanceof Error ? { sentence: error.message } : (error as { theirs: never })),
    copies: {
      read: () => store.copy,
      keep: (copy) => {
        store.copy = copy;
        return true;
      },
      drop: () => {
        store.copy = null;
      },
    },
  };
  return { made, store };
}

const saves: KeeperPorts["save"] = async ({ version }) => ({
  version: version + 1,
  savedAt: "2026-12-01T10:42:00.000Z",
});

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

describe("the keeper of a draft", () => {
  it("saves two seconds after the last key, once", async () => {
    const { made } = ports(saves);
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "W");
    await vi.advanceTimersByTimeAsync(idleMs - 500);
    keeper.change("plan", "Walk");
    await vi.advanceTimersByTimeAsync(idleMs - 1);
    expect(made.save).not.toHaveBeenCalled();
    await vi.advanceTimersByTimeAsync(1);
    expect(made.save).toHaveBeenCalledExactlyOnceWith({ noteId: "n1", version: 1, body: { plan: "Walk" } });
    expect(keeper.current()).toMatchObject({ state: "saved", savedAt: "2026-12-01T10:42:00.000Z" });
    expect(keeper.version).toBe(2);
  });

  it("saves while someone writes without a pause", async () => {
    const { made } = ports(saves);
    const keeper = new NoteKeeper(note, made);
    for (let i = 0; i <= longestMs / 1000; i += 1) {
      keeper.change("plan", "x".repeat(i + 1));
      await vi.advanceTimersByTimeAsync(1000);
    }
    expect(made.save).toHaveBeenCalledTimes(1);
  });

  it("keeps words typed during a save, and sends them next with the new version", async () => {
    let answer: (saved: { version: number; savedAt: string }) => void = () => undefined;
    const { made } = ports(
      () =>
        new Promise((resolve) => {
          answer = resolve;
        }),
    );
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    const flushed = keeper.flush();
    keeper.change("plan", "Walk twice");
    answer({ version: 2, savedAt: "t" });
    await vi.advanceTimersByTimeAsync(0);
    expect(made.save).toHaveBeenLastCalledWith({ noteId: "n1", version: 2, body: { plan: "Walk twice" } });
    answer({ version: 3, savedAt: "t" });
    expect(await flushed).toBe(true);
  });

  it("sends one text at a time, however many wait for the save before it", async () => {
    const answers: ((saved: { version: number; savedAt: string }) => void)[] = [];
    const { made } = ports(() => new Promise((resolve) => answers.push(resolve)));
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    const waiting = [keeper.flush()];
    keeper.change("plan", "Walk twice");
    waiting.push(keeper.flush(), keeper.flush());
    answers[0]?.({ version: 2, savedAt: "t" });
    await vi.advanceTimersByTimeAsync(0);
    expect(made.save).toHaveBeenCalledTimes(2);
    answers[1]?.({ version: 3, savedAt: "t" });
    expect(await Promise.all(waiting)).toEqual([true, true, true]);
    expect(made.save).toHaveBeenCalledTimes(2);
  });

  it("keeps the text here when the network fails, says so, tries again and then forgets the copy", async () => {
    let isDown = true;
    const { made, store } = ports(async (input) => {
      if (isDown) throw new Error("Withy could not be reached.");
      return saves(input);
    });
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    expect(await keeper.flush()).toBe(false);
    expect(keeper.current()).toMatchObject({ state: "kept-here", failure: "Withy could not be reached." });
    expect(store.copy?.body).toEqual({ plan: "Walk" });
    isDown = false;
    await vi.advanceTimersByTimeAsync(retryMs);
    expect(keeper.current()).toMatchObject({ state: "saved", failure: null });
    expect(store.copy).toBeNull();
  });

  it("never writes over another text: it waits for a choice, then goes on from the other version", async () => {
    const theirs = { version: 7, body: { plan: "Swim" }, savedAt: "2026-12-01T10:40:00.000Z" };
    let isClash = true;
    const { made, store } = ports(async (input) => {
      if (isClash) throw { theirs };
      return saves(input);
    });
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    expect(await keeper.flush()).toBe(false);
    expect(keeper.current()).toMatchObject({ state: "clash", clash: { theirs, mine: { plan: "Walk" } } });
    expect(store.copy?.body).toEqual({ plan: "Walk" });
    await vi.advanceTimersByTimeAsync(60_000);
    expect(made.save).toHaveBeenCalledTimes(1);
    isClash = false;
    keeper.settle({ plan: "Walk\nSwim" });
    await vi.advanceTimersByTimeAsync(0);
    expect(made.save).toHaveBeenLastCalledWith({ noteId: "n1", version: 7, body: { plan: "Walk\nSwim" } });
    expect(keeper.current()).toMatchObject({ state: "saved", clash: null });
  });

  it("taking the other text saves nothing", async () => {
    const theirs = { version: 7, body: { plan: "Swim" }, savedAt: "t" };
    const { made } = ports(async () => {
      throw { theirs };
    });
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    await keeper.flush();
    keeper.settle(theirs.body);
    expect(await keeper.flush()).toBe(true);
    expect(made.save).toHaveBeenCalledTimes(1);
    expect(keeper.version).toBe(7);
  });

  it("brings back what an earlier page could not send, or asks where the note has moved on", async () => {
    const copy = { version: 1, body: { plan: "Walk" }, keptAt: "2026-12-01T10:40:00.000Z" };
    const same = ports(saves, copy);
    const keeper = new NoteKeeper(note, same.made);
    keeper.restore();
    expect(keeper.current()).toMatchObject({ body: { plan: "Walk" }, broughtBack: copy.keptAt });
    await vi.advanceTimersByTimeAsync(idleMs);
    expect(same.made.save).toHaveBeenCalledTimes(1);
    const moved = new NoteKeeper({ ...note, version: 4, body: { plan: "Swim" } }, ports(saves, copy).made);
    moved.restore();
    expect(moved.current()).toMatchObject({
      state: "clash",
      clash: { mine: { plan: "Walk" }, theirs: { version: 4 } },
    });
  });

  it("keeps unsaved words when the page goes away, and nothing when all is saved", async () => {
    const { made, store } = ports(saves);
    const keeper = new NoteKeeper(note, made);
    keeper.leave();
    expect(store.copy).toBeNull();
    keeper.change("plan", "Walk");
    keeper.leave();
    expect(store.copy).not.toBeNull();
    await vi.advanceTimersByTimeAsync(0);
    expect(store.copy).toBeNull();
  });

  it("keeps nothing once what was typed is taken back", async () => {
    const { made, store } = ports(async () => {
      throw new Error("Withy could not be reached.");
    });
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    await keeper.flush();
    expect(store.copy).not.toBeNull();
    keeper.change("plan", "");
    await vi.advanceTimersByTimeAsync(idleMs);
    expect(store.copy).toBeNull();
    expect(keeper.current()).toMatchObject({ state: "saved", failure: null });
  });

  it("keeps nothing after a sign-out, though a save fails late; and keeps again for whoever stayed", async () => {
    let fail: (reason: Error) => void = () => undefined;
    const { made, store } = ports(
      () =>
        new Promise((_, reject) => {
          fail = reject;
        }),
    );
    const keeper = new NoteKeeper(note, made);
    keeper.change("plan", "Walk");
    void keeper.flush();
    keeper.abandon();
    fail(new Error("Your session has ended."));
    await vi.advanceTimersByTimeAsync(retryMs);
    keeper.leave();
    expect(store.copy).toBeNull();
    expect(made.save).toHaveBeenCalledTimes(1);
    keeper.change("plan", "Walk on");
    keeper.leave();
    expect(store.copy?.body).toEqual({ plan: "Walk on" });
  });
});
