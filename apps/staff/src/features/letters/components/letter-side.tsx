"use client";
import type { LetterView } from "@withy/contracts/letters";
import { Button, ButtonLink } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import { letterPdfAddress } from "../api-client";
import type { LetterDraftHandle, SaveState } from "../hooks/use-letter-draft";
import { DeliveryList } from "./delivery-list";
import { LetterChecks } from "./letter-checks";
import { MissingSentences } from "./missing-sentences";
import { StaleBox } from "./stale-box";
import { WhoDoesWhat } from "./who-does-what";

interface LetterSideProps {
  letter: LetterView;
  /** While it is written. */
  handle?: LetterDraftHandle;
  onSign?: () => void;
  onSend?: () => void;
}

const saveWords: Record<SaveState, string> = {
  saved: "Saved",
  typing: "Not saved yet",
  saving: "Saving",
  failed: "Not saved",
};

/** What must be seen before the letter goes, and what became of it after. */
export function LetterSide({ letter, handle, onSign, onSend }: LetterSideProps) {
  const sections = handle?.draft.sections ?? letter.sections;
  return (
    <aside
      className="letter-side"
      aria-label={letter.state === "draft" ? "Before it goes" : "The letter's way"}
    >
      {handle &&
        letter.stale.map((sentence) => <StaleBox key={sentence.id} sentence={sentence} handle={handle} />)}
      <SectionHead title="Who does what" />
      <WhoDoesWhat sections={sections} />
      {handle && letter.missing.length > 0 && <MissingSentences letter={letter} handle={handle} />}
      <SectionHead title="Goes to" />
      <DeliveryList letter={letter} />
      {letter.state === "draft" && (
        <>
          <SectionHead title="Before you sign" />
          <LetterChecks letter={letter} />
        </>
      )}
      <div className="letter-foot">
        {handle && (
          <p className="soft small" role="status">
            {saveWords[handle.state]}
          </p>
        )}
        {onSign && (
          <Button kind="primary" shortcut="Ctrl Enter" onClick={onSign}>
            Sign and send…
          </Button>
        )}
        {onSend && letter.canSend && (
          <Button kind="primary" onClick={onSend}>
            Send…
          </Button>
        )}
        <ButtonLink
          href={letterPdfAddress(letter.id)}
          target="_blank"
          onClick={() => void handle?.flush().catch(() => undefined)}
        >
          PDF
        </ButtonLink>
      </div>
    </aside>
  );
}
