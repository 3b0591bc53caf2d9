"use client";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { type ReactNode, useState, useTransition } from "react";
import { usePersonId } from "./person-id";
import { dropAllCopies, hasCopies } from "./unsent-copy";

/** Something on the page that is being written. */
export interface Writer {
  /** Saves what is not saved yet. True once nothing is left. */
  flush(): Promise<boolean>;
  /** The person signs out: what could not be saved is given up and kept nowhere. */
  abandon(): void;
}

const writers = new Set<Writer>();
const longestWaitMs = 5000;

/** Saves before a sign-out until the returned function is called. */
export function joinLeaving(writer: Writer): () => void {
  writers.add(writer);
  return () => writers.delete(writer);
}

async function saveAll(personId: string): Promise<boolean> {
  const late = new Promise<boolean>((resolve) => window.setTimeout(() => resolve(false), longestWaitMs));
  const saved = await Promise.all([...writers].map((writer) => Promise.race([writer.flush(), late])));
  return saved.every(Boolean) && !hasCopies(personId);
}

/**
 * Signs out by `go` once all is saved and this browser keeps no text. Where something cannot be saved it asks first;
 * the caller shows `question`.
 */
export function useLeaving(go: () => unknown): { leave: () => void; question: ReactNode } {
  const personId = usePersonId();
  const [isAsking, setAsking] = useState(false);
  const [, start] = useTransition();
  const leaveNow = async () => {
    setAsking(false);
    for (const writer of writers) writer.abandon();
    dropAllCopies();
    await go();
  };
  const leave = () =>
    start(async () => {
      if (await saveAll(personId)) await leaveNow();
      else setAsking(true);
    });
  const question = isAsking && (
    <Dialog
      open
      onOpenChange={setAsking}
      title="Sign out and lose unsaved text?"
      lead="Part of a note could not be saved. It stands in this browser only, and signing out removes it, so that nobody else reads it here."
      closeLabel="Stay signed in"
      actions={
        <Button kind="stop" onClick={() => start(leaveNow)}>
          Sign out and lose it
        </Button>
      }
    />
  );
  return { leave, question };
}
