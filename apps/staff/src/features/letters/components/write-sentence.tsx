"use client";
import type { LetterSection, LetterSentence, LetterView } from "@withy/contracts/letters";
import { type LetterActor, letterActors } from "@withy/contracts/letters/headings";
import { Button } from "@withy/ui/button";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { withActor, withText } from "../letter-draft";
import { actorWords } from "../letter-words";
import { SentenceSource } from "./sentence-source";

interface WriteSentenceProps {
  place: number;
  sentence: LetterSentence;
  section: LetterSection;
  handle: LetterDraftHandle;
  letter: LetterView;
  isStale: boolean;
}

const isActor = (text: string): text is LetterActor => letterActors.some((actor) => actor === text);

/** One sentence, open to typing. Emptied, it is left out of the letter, and can be put back. */
export function WriteSentence({ place, sentence, section, handle, letter, isStale }: WriteSentenceProps) {
  const { draft, change } = handle;
  const name = `${section.heading}, sentence ${place + 1}`;
  const isLeftOut = sentence.text === "" && sentence.assembled !== null;
  const setText = (text: string) => change(withText(draft, section.key, sentence.id, text));
  return (
    <div className="letter-line" data-stale={isStale ? "" : undefined}>
      <SentenceSource sentence={sentence} letter={letter} isStale={isStale} />
      <div className="letter-words">
        {section.key === "plan" && (
          <select
            aria-label={`${name}: who does it`}
            value={sentence.actor ?? "practice"}
            onChange={({ target }) =>
              isActor(target.value) && change(withActor(draft, section.key, sentence.id, target.value))
            }
          >
            {letterActors.map((actor) => (
              <option key={actor} value={actor}>
                {actorWords[actor]}
              </option>
            ))}
          </select>
        )}
        <div className="letter-grow" data-text={sentence.text}>
          <textarea
            id={`sentence-${section.key}-${place}`}
            aria-label={isStale ? `${name}, out of date` : name}
            rows={1}
            value={sentence.text}
            placeholder={isLeftOut ? `Left out: ${sentence.assembled}` : "Write the sentence"}
            onChange={(event) => setText(event.target.value)}
          />
        </div>
        {isLeftOut && (
          <Button kind="plain" size="small" onClick={() => setText(sentence.assembled ?? "")}>
            Put back<span className="vh"> {name}</span>
          </Button>
        )}
        {sentence.keptBecause && (
          <p className="letter-kept">Kept against the record: {sentence.keptBecause}</p>
        )}
      </div>
    </div>
  );
}
