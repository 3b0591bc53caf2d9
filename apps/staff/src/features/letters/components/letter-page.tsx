"use client";
import type { LetterView } from "@withy/contracts/letters";
import { Page } from "@withy/ui/page";
import { useLetter } from "../hooks/use-letter";
import { ReadLetter } from "./read-letter";
import { WriteLetter } from "./write-letter";

/** A letter: written while it is a draft of one's own, else read as its reader gets it. */
export function LetterPage({ letter: first }: { letter: LetterView }) {
  const letter = useLetter(first).data;
  return (
    <Page className="letter">
      {letter.canWrite ? <WriteLetter letter={letter} /> : <ReadLetter letter={letter} />}
    </Page>
  );
}
