import type { NoteView } from "@withy/contracts/clinical";
import { describe, expect, it } from "vitest";
import { newerNote } from "./newer-note";

const at = (version: number, addenda = 0, episodeVersion = 1) =>
  ({
    version,
    addenda: Array.from({ length: addenda }),
    episode: { version: episodeVersion },
  }) as unknown as NoteView;

describe("which of two views of a note is shown", () => {
  it.each([
    ["what was saved here since the page was rendered", at(5), at(1), "held"],
    ["what was saved somewhere else", at(1), at(5), "rendered"],
    ["an addendum added here", at(5, 1), at(5), "held"],
    ["an addendum added somewhere else", at(5), at(5, 1), "rendered"],
    ["red flags kept here", at(5, 0, 3), at(5, 0, 2), "held"],
    ["red flags kept somewhere else", at(5, 0, 2), at(5, 0, 3), "rendered"],
  ])("%s", (_name, held, rendered, wins) => {
    expect(newerNote(held, rendered)).toBe(wins === "held" ? held : rendered);
  });
});
