import type { LetterSentence, LetterView } from "@withy/contracts/letters";
import Link from "next/link";
import { sourceAddress } from "../letter-words";

interface SentenceSourceProps {
  sentence: LetterSentence;
  letter: Pick<LetterView, "patient" | "episode" | "author">;
  isStale?: boolean;
}

/** The margin note that ties a sentence to the row it was made from. */
export function SentenceSource({ sentence, letter, isStale = false }: SentenceSourceProps) {
  const { source, text, assembled } = sentence;
  if (!source) return <span className="letter-source">typed by {letter.author.name.split(" ")[0]}</span>;
  const isEdited = assembled !== null && text !== assembled;
  return (
    <span className="letter-source" data-stale={isStale ? "" : undefined}>
      <Link href={sourceAddress(source, letter)}>{source.label}</Link>
      {isEdited && text !== "" && <span className="letter-edited">edited</span>}
    </span>
  );
}
