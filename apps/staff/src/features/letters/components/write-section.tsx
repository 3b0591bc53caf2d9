"use client";
import type { LetterSection, LetterView, StaleSentence } from "@withy/contracts/letters";
import { Button } from "@withy/ui/button";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { withNewSentence } from "../letter-draft";
import { WriteSentence } from "./write-sentence";

interface WriteSectionProps {
  section: LetterSection;
  handle: LetterDraftHandle;
  letter: LetterView;
  stale: ReadonlyMap<string, StaleSentence>;
}

/** One part of the letter, a line for each sentence. */
export function WriteSection({ section, handle, letter, stale }: WriteSectionProps) {
  const add = () => {
    const id = `new-${crypto.randomUUID()}`;
    handle.change(withNewSentence(handle.draft, section.key, id));
    // The new line is on the page only after this change is drawn.
    requestAnimationFrame(() =>
      document.getElementById(`sentence-${section.key}-${section.sentences.length}`)?.focus(),
    );
  };
  return (
    <section aria-labelledby={`part-${section.key}`}>
      <div className="letter-part">
        <h2 id={`part-${section.key}`}>{section.heading}</h2>
        <Button kind="plain" size="small" onClick={add}>
          Add a sentence<span className="vh"> to {section.heading}</span>
        </Button>
      </div>
      {section.sentences.map((sentence, index) => (
        <WriteSentence
          // By place: a new line gets its lasting id from the server, and must keep the caret then.
          key={index}
          place={index}
          sentence={sentence}
          section={section}
          handle={handle}
          letter={letter}
          isStale={stale.has(sentence.id)}
        />
      ))}
    </section>
  );
}
