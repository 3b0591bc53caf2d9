"use client";
import type { StaleSentence } from "@withy/contracts/letters";
import { Button, Buttons } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { Glyph } from "@withy/ui/glyph";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { fieldProblem } from "@/api/form-problems";
import { ApiError } from "@/api/request";
import { settleSentence } from "../api-client";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { useLetterWrite } from "../hooks/use-letter-write";

/** One sentence whose source has changed: what the record says now, and the two ways to settle it. */
export function StaleBox({ sentence, handle }: { sentence: StaleSentence; handle: LetterDraftHandle }) {
  const [isKeeping, setIsKeeping] = useState(false);
  const [reason, setReason] = useState("");
  const settle = useLetterWrite(settleSentence);
  const choose = async (choice: "take" | "keep") => {
    const { id, version } = await handle.flush();
    const view = await settle.mutateAsync({ letterId: id, version, sentenceId: sentence.id, choice, reason });
    handle.take(view);
    setIsKeeping(false);
  };
  const run = (choice: "take" | "keep") => void choose(choice).catch(() => undefined);
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
      <Dialog
        open={isKeeping}
        onOpenChange={setIsKeeping}
        title="Keep your words"
        lead="The sentence stays as it is, and the reason stays with the letter. It is not printed."
        actions={
          <Button kind="primary" busy={settle.isPending} onClick={() => run("keep")}>
            Keep the sentence
          </Button>
        }
      >
        <TextInput
          id="keep-reason"
          label="Why it stays"
          maxLength={300}
          value={reason}
          error={fieldProblem(settle.error, "reason")}
          onChange={(event) => setReason(event.target.value)}
        />
      </Dialog>
    </section>
  );
}
