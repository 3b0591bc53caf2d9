"use client";
import type { LetterView } from "@withy/contracts/letters";
import { Button } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import { settleSentence } from "../api-client";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { useLetterWrite } from "../hooks/use-letter-write";

/** What the record has gained since the letter was begun. */
export function MissingSentences({ letter, handle }: { letter: LetterView; handle: LetterDraftHandle }) {
  const settle = useLetterWrite(settleSentence);
  const add = async (sentenceId: string) => {
    const { id, version } = await handle.flush();
    handle.take(await settle.mutateAsync({ letterId: id, version, sentenceId, choice: "take" }));
  };
  return (
    <>
      <SectionHead title="New in the record" />
      <ul className="letter-list">
        {letter.missing.flatMap((section) =>
          section.sentences.map((sentence) => (
            <li key={sentence.id}>
              <span className="small soft">
                {section.heading}, {sentence.source?.label}
              </span>
              {sentence.text}{" "}
              <Button
                kind="plain"
                size="small"
                busy={settle.isPending}
                onClick={() => void add(sentence.id).catch(() => undefined)}
              >
                Put it in<span className="vh">: {sentence.text}</span>
              </Button>
            </li>
          )),
        )}
      </ul>
    </>
  );
}
