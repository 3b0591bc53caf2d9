"use client";
import type { StaleSentence } from "@withy/contracts/letters";
import { Button, Buttons } from "@withy/ui/button";
import { Glyph } from "@withy/ui/glyph";
import dynamic from "next/dynamic";
import { useState } from "react";
import { ApiError } from "@/api/request";
import { settleSentence } from "../api-client";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { useLetterWrite } from "../hooks/use-letter-write";

const KeepDialog = dynamic(() => import("./keep-dialog").then((part) => part.KeepDialog), { ssr: false });

/** One sentence whose source has changed: what the record says now, and the two ways to settle it. */
export function StaleBox({ sentence, handle }: { sentence: StaleSentence; handle: LetterDraftHandle }) {
  const [isKeeping, setIsKeeping] = useState(false);
  const settle = useLetterWrite(settleSentence);
  const choose = async (choice: "take" | "keep", reason = "") => {
    const { id, version } = await handle.flush();
    const view = await settle.mutateAsync({ letterId: id, version, sentenceId: sentence.id, choice, reason });
    handle.take(view);
    setIsKeeping(false);
  };
  const run = (choice: "take" | "keep", reason?: string) =>
    void choose(choice, reason).catch(() => undefined);
  const said = settle.error instanceof ApiError && !isKeeping ? settle.error.problem.detail : null;
  return (
    <section className="letter-stale">
      <h3>
        <Glyph name="warn" /> One sentence is out of date
      </h3>
      <p>
        {sentence.now === null
          ? "The record no longer says anything about this."
          : `The record now says: ${sentence.now}`}
      </p>
      {said && <p className="danger">{said}</p>}
      <Buttons>
        <Button kind="primary" size="small" busy={settle.isPending} onClick={() => run("take")}>
          {sentence.now === null ? "Take it out" : "Put it in"}
        </Button>
        <Button size="small" onClick={() => setIsKeeping(true)}>
          Keep, say why…
        </Button>
      </Buttons>
      {isKeeping && (
        <KeepDialog
          error={settle.error}
          isBusy={settle.isPending}
          onKeep={(reason) => run("keep", reason)}
          onClose={() => setIsKeeping(false)}
        />
      )}
    </section>
  );
}
