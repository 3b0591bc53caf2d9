"use client";
import type { LetterView } from "@withy/contracts/letters";
import { AlertLine } from "@withy/ui/alert-line";
import dynamic from "next/dynamic";
import { useState } from "react";
import { actorWords } from "../letter-words";
import { LetterHead } from "./letter-head";
import { LetterSide } from "./letter-side";
import { SentenceSource } from "./sentence-source";
import { Signature } from "./signature";

const SendDialog = dynamic(() => import("./send-dialog").then((part) => part.SendDialog), { ssr: false });

/** A signed letter, or a colleague's draft: every word as it stands, each with its source. */
export function ReadLetter({ letter }: { letter: LetterView }) {
  const [isSending, setIsSending] = useState(false);
  const { name, addressLines } = letter.recipient;
  return (
    <>
      <article className="letter-sheet" aria-label="The letter">
        <p className="letter-margin">where each sentence is from</p>
        <LetterHead
          letter={letter}
          recipient={<p className="letter-address">{[name, ...addressLines].join("\n")}</p>}
        />
        {letter.state === "draft" && (
          <AlertLine>This is {letter.author.name}’s draft. Only its writer changes and signs it.</AlertLine>
        )}
        <h1>{letter.title}</h1>
        <p className="letter-dear">Dear {name}</p>
        {letter.sections.map((section) => (
          <ReadSection key={section.key} section={section} letter={letter} />
        ))}
        <Signature letter={letter} />
      </article>
      <LetterSide letter={letter} onSend={() => setIsSending(true)} />
      {isSending && <SendDialog letter={letter} onClose={() => setIsSending(false)} />}
    </>
  );
}

function ReadSection({ section, letter }: { section: LetterView["sections"][number]; letter: LetterView }) {
  const said = section.sentences.filter((sentence) => sentence.text !== "");
  if (said.length === 0) return null;
  return (
    <section aria-labelledby={`part-${section.key}`}>
      <h2 id={`part-${section.key}`}>{section.heading}</h2>
      {said.map((sentence) => (
        <div key={sentence.id} className="letter-line">
          <SentenceSource sentence={sentence} letter={letter} />
          <p>
            {sentence.actor && <b className="letter-actor">{actorWords[sentence.actor]}</b>} {sentence.text}
          </p>
        </div>
      ))}
    </section>
  );
}
