import type { NoteView, StaleNote } from "@withy/contracts/clinical";
import { useEffect, useRef, useState, useSyncExternalStore } from "react";
import { ApiError } from "@/api/request";
import { joinLeaving } from "@/components/leaving";
import { usePersonId } from "@/components/person-id";
import { dropCopy, keepCopy, readCopy } from "@/components/unsent-copy";
import { saveNoteDraft } from "../api-client";
import { type KeeperPorts, NoteKeeper } from "../note-keeper";
import { useNoteChange } from "./use-note";

function explain(error: unknown): ReturnType<KeeperPorts["explain"]> {
  if (!(error instanceof ApiError))
    return { sentence: "Something went wrong in this page. Reload it and try again." };
  const { theirs } = error.problem.more as Partial<StaleNote>;
  return error.status === 412 && theirs ? { theirs } : { sentence: error.problem.detail };
}

/** The text being written, with the keeper that saves it. */
export function useNoteDraft(note: NoteView) {
  const hold = useRef(useNoteChange(note));
  const place = { personId: usePersonId(), noteId: note.id };
  const [keeper] = useState(
    () =>
      new NoteKeeper(note, {
        save: async (input) => {
          const saved = await saveNoteDraft(input);
          hold.current((held) => ({
            ...held,
            body: input.body,
            version: saved.version,
            updatedAt: saved.savedAt,
          }));
          return saved;
        },
        explain,
        copies: {
          read: () => readCopy(place),
          keep: (copy) => keepCopy(place, copy),
          drop: () => dropCopy(place),
        },
      }),
  );
  const view = useSyncExternalStore(keeper.subscribe, keeper.current, keeper.current);
  useEffect(() => {
    keeper.restore();
    const stay = joinLeaving(keeper);
    const again = () => void keeper.flush();
    const onHide = () => keeper.leave();
    const onVisibility = () => document.visibilityState === "hidden" && again();
    window.addEventListener("online", again);
    window.addEventListener("pagehide", onHide);
    document.addEventListener("visibilitychange", onVisibility);
    return () => {
      window.removeEventListener("online", again);
      window.removeEventListener("pagehide", onHide);
      document.removeEventListener("visibilitychange", onVisibility);
      stay();
      keeper.leave();
    };
  }, [keeper]);
  return { ...view, keeper };
}

export type NoteDraft = ReturnType<typeof useNoteDraft>;
