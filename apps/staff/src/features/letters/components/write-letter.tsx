"use client";
import type { LetterView } from "@withy/contracts/letters";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import dynamic from "next/dynamic";
import { useState } from "react";
import { ApiError } from "@/api/request";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { fetchLetter } from "../api-client";
import { type LetterDraftHandle, useLetterDraft } from "../hooks/use-letter-draft";
import { AddSection } from "./add-section";
import { LetterHead } from "./letter-head";
import { LetterSide } from "./letter-side";
import { RecipientFields } from "./recipient-fields";
import { Signature } from "./signature";
import { WriteSection } from "./write-section";

// Fetched when it is first needed: most looks at a letter sign nothing.
const SignDialog = dynamic(() => import("./sign-dialog").then((part) => part.SignDialog), { ssr: false });

/** The page that the reader gets, with every word open to its writer and its source in the gutter. */
export function WriteLetter({ letter }: { letter: LetterView }) {
  const handle = useLetterDraft(letter);
  const [signing, setSigning] = useState<LetterView | null>(null);
  const stale = new Map(letter.stale.map((sentence) => [sentence.id, sentence]));
  const sign = () => void handle.flush().then(setSigning, () => undefined);
  useShortcut("sign", sign, signing === null);
  return (
    <>
      <article className="letter-sheet" aria-label="The letter">
        <p className="letter-margin">where each sentence is from</p>
        <LetterHead letter={letter} recipient={<RecipientFields handle={handle} />} />
        <SaveTrouble handle={handle} letterId={letter.id} />
        <h1>{letter.title}</h1>
        <p className="letter-dear">Dear {handle.draft.recipient.name || "…"}</p>
        {handle.draft.sections.map((section) => (
          <WriteSection key={section.key} section={section} handle={handle} letter={letter} stale={stale} />
        ))}
        <AddSection handle={handle} />
        <Signature letter={letter} />
      </article>
      <LetterSide letter={letter} handle={handle} onSign={sign} />
      {signing && <SignDialog letter={signing} onClose={() => setSigning(null)} onSigned={handle.take} />}
    </>
  );
}

/** Why the last save did not go through, beside the words that wait. */
function SaveTrouble({ handle, letterId }: { handle: LetterDraftHandle; letterId: string }) {
  const { error } = handle;
  if (!error) return null;
  const isStale = error instanceof ApiError && error.problem.code === "stale";
  const said =
    error instanceof ApiError
      ? (error.problem.fields[0]?.message ?? error.problem.detail)
      : "The letter could not be saved.";
  return (
    <AlertLine tone="danger" live>
      <p>Not saved. {said}</p>
      {isStale ? (
        <Button size="small" onClick={() => void fetchLetter(letterId).then(handle.take)}>
          Show the other version, and lose what is typed here
        </Button>
      ) : (
        <Button size="small" onClick={() => void handle.flush().catch(() => undefined)}>
          Save again
        </Button>
      )}
    </AlertLine>
  );
}
