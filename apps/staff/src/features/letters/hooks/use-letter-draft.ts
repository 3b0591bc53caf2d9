import { useQueryClient } from "@tanstack/react-query";
import type { LetterView } from "@withy/contracts/letters";
import { useCallback, useEffect, useRef, useState } from "react";
import { saveLetter } from "../api-client";
import { draftOf, type LetterDraft, saveInputOf } from "../letter-draft";
import { letterKeys } from "../query-keys";

export type SaveState = "saved" | "typing" | "saving" | "failed";

const pauseMs = 1_000;

/**
 * The letter while it is written: typing is kept on screen at once and saved after a short pause, one save at a time.
 * `flush` saves what is left and answers the letter as saved; it throws where the save was refused.
 */
export function useLetterDraft(letter: LetterView) {
  const client = useQueryClient();
  const [draft, setDraft] = useState(() => draftOf(letter));
  const [state, setState] = useState<SaveState>("saved");
  const [error, setError] = useState<unknown>(null);
  const at = useRef({
    draft,
    view: letter,
    typed: 0,
    saved: 0,
    timer: 0,
    saving: null as Promise<LetterView> | null,
  });

  const take = useCallback(
    (view: LetterView) => {
      at.current.view = view;
      at.current.draft = draftOf(view);
      at.current.saved = at.current.typed;
      setDraft(at.current.draft);
      setState("saved");
      setError(null);
      client.setQueryData(letterKeys.letter(view.id), view);
    },
    [client],
  );

  const flush = useCallback(async (): Promise<LetterView> => {
    const now = at.current;
    window.clearTimeout(now.timer);
    if (now.saving) await now.saving.catch(() => undefined);
    if (now.typed === now.saved) return now.view;
    const mark = now.typed;
    setState("saving");
    now.saving = saveLetter(saveInputOf(now.view.id, now.view.version, now.draft));
    try {
      const view = await now.saving;
      if (now.typed === mark) take(view);
      else {
        // More was typed meanwhile: the words on screen win, the version is the server's.
        now.view = view;
        now.saved = mark;
        setState("typing");
        now.timer = window.setTimeout(() => void flush().catch(() => undefined), pauseMs);
      }
      return view;
    } catch (failure) {
      setState("failed");
      setError(failure);
      throw failure;
    } finally {
      now.saving = null;
    }
  }, [take]);

  const change = useCallback(
    (next: LetterDraft) => {
      const now = at.current;
      now.draft = next;
      now.typed += 1;
      setDraft(next);
      setState("typing");
      window.clearTimeout(now.timer);
      now.timer = window.setTimeout(() => void flush().catch(() => undefined), pauseMs);
    },
    [flush],
  );

  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (at.current.typed !== at.current.saved) event.preventDefault();
    };
    const held = at.current;
    window.addEventListener("beforeunload", warn);
    return () => {
      window.removeEventListener("beforeunload", warn);
      window.clearTimeout(held.timer);
      if (held.typed !== held.saved) void flush().catch(() => undefined);
    };
  }, [flush]);

  // The record may have moved on while nothing was typed here.
  useEffect(() => {
    const now = at.current;
    if (now.typed === now.saved && letter.version >= now.view.version) {
      now.view = letter;
      if (letter.sections !== now.draft.sections) {
        now.draft = draftOf(letter);
        setDraft(now.draft);
      }
    }
  }, [letter]);

  return { draft, change, state, error, flush, take, version: () => at.current.view.version };
}

export type LetterDraftHandle = ReturnType<typeof useLetterDraft>;
