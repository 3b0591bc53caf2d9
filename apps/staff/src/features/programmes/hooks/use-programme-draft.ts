import { useMutation } from "@tanstack/react-query";
import { checkProgramme } from "@withy/clinical/programmes/check-programme";
import type { Programme } from "@withy/clinical/programmes/programme";
import type { ProgrammeView, SaveProgrammeInput } from "@withy/contracts/programmes";
import { useCallback, useEffect, useRef, useState } from "react";
import { ApiError } from "@/api/request";
import { fetchProgramme, saveProgramme } from "../api-client";
import { useAutosave } from "./use-autosave";

export interface Draft {
  readonly title: string;
  readonly content: Programme;
}

export type KeptState = "saved" | "changed" | "saving" | "failed" | "clash";

interface Failure {
  readonly message: string;
  /** Someone else saved in between. */
  readonly isClash: boolean;
}

const draftOf = (view: ProgrammeView): Draft => ({ title: view.title, content: view.content });
const isSame = (a: Draft, b: Draft) => a === b || JSON.stringify(a) === JSON.stringify(b);

function inputOf(seen: ProgrammeView, draft: Draft): SaveProgrammeInput {
  const { equipmentMissing, items, ...rest } = draft.content;
  const content = { ...rest, equipmentMissing: [...equipmentMissing], items: [...items] };
  return { programmeId: seen.id, version: seen.version, title: draft.title, content };
}

function failureOf(error: unknown): Failure {
  const isClash = error instanceof ApiError && error.problem.code === "stale";
  return { isClash, message: error instanceof Error ? error.message : "It could not be saved. Try again." };
}

function stateOf(isDirty: boolean, isSaving: boolean, failure: Failure | null): KeptState {
  if (failure?.isClash) return "clash";
  if (isSaving) return "saving";
  if (failure && isDirty) return "failed";
  return isDirty ? "changed" : "saved";
}

/** What was saved last and what stands on the screen, with the one way to send the second after the first. */
function useKept(first: ProgrammeView) {
  const [seen, setSeen] = useState(first);
  const [draft, setDraft] = useState<Draft>(() => draftOf(first));
  const [failure, setFailure] = useState<Failure | null>(null);
  const { mutateAsync, isPending } = useMutation({ mutationFn: saveProgramme });
  const latest = useRef({ seen, draft });
  useEffect(() => {
    latest.current = { seen, draft };
  });
  const accept = useCallback((view: ProgrammeView) => {
    setSeen(view);
    setDraft(draftOf(view));
    setFailure(null);
  }, []);
  const send = useCallback(async (): Promise<ProgrammeView | null> => {
    const now = latest.current;
    if (isSame(now.draft, draftOf(now.seen))) return now.seen;
    try {
      const view = await mutateAsync(inputOf(now.seen, now.draft));
      setSeen(view);
      setFailure(null);
      // What the server trimmed is taken over, unless typing went on meanwhile.
      setDraft((current) => (isSame(current, now.draft) ? draftOf(view) : current));
      return view;
    } catch (error) {
      setFailure(failureOf(error));
      return null;
    }
  }, [mutateAsync]);
  return { seen, setSeen, draft, setDraft, failure, setFailure, accept, send, isPending };
}

/**
 * The programme as it is being built: saved by itself shortly after the last change, never while a number is out of
 * range, and never over somebody else's save.
 */
export function useProgrammeDraft(first: ProgrammeView) {
  const kept = useKept(first);
  const { seen, draft, failure, isPending, send, setDraft } = kept;
  const isDirty = !isSame(draft, draftOf(seen));
  const problem = checkProgramme(draft.content);
  const save = useCallback(() => void send(), [send]);
  useAutosave(
    { draft, isDirty },
    {
      isHeld: problem !== null || draft.title.trim() === "" || isPending || failure?.isClash === true,
      hasFailed: failure !== null,
      save,
    },
  );
  return {
    seen,
    draft,
    problem,
    failure,
    state: stateOf(isDirty, isPending, failure),
    change: (update: (content: Programme) => Programme) =>
      setDraft((current) => ({ ...current, content: update(current.content) })),
    rename: (title: string) => setDraft((current) => ({ ...current, title })),
    send,
    accept: kept.accept,
    takeTheirs: async () => kept.accept(await fetchProgramme(first.id)),
    keepMine: async () => {
      kept.setSeen(await fetchProgramme(first.id));
      kept.setFailure(null);
    },
  };
}

export type ProgrammeDraft = ReturnType<typeof useProgrammeDraft>;
