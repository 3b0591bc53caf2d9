"use client";
import type { DuplicateCandidate } from "@withy/contracts/patients";
import { plainDateWords } from "@withy/core/date-words";
import { Button, Buttons } from "@withy/ui/button";
import Link from "next/link";
import { useEffect, useRef } from "react";

const reasonWords: Record<DuplicateCandidate["reasons"][number], string> = {
  "born-and-name": "same date of birth and a similar name",
  phone: "same phone",
  "nhs-number": "same NHS number",
};

interface Props {
  message: string;
  candidates: readonly DuplicateCandidate[];
  /** Changes with every try, so that the notice takes the focus again. */
  attempt: number;
  isSaving: boolean;
  onSomeoneElse: () => void;
}

/** Shows who may be the same person, and the two ways on: open that record, or say that it is someone else. */
export function DuplicateNotice({ message, candidates, attempt, isSaving, onSomeoneElse }: Props) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => box.current?.focus(), [attempt]);
  return (
    <div className="summary" role="alert" tabIndex={-1} ref={box} aria-labelledby="duplicate-title">
      <h2 id="duplicate-title" className="text-ui font-ui font-semibold">
        {message}
      </h2>
      <ul className="candidates">
        {candidates.map((one) => (
          <li key={one.id}>
            <Link href={`/patients/${one.id}`}>{one.name}</Link>
            <span>
              born {plainDateWords(one.bornOn)}
              {one.phone && `, ${one.phone}`}
              {one.postcode && `, ${one.postcode}`}
            </span>
            <span className="soft">{one.reasons.map((reason) => reasonWords[reason]).join(", ")}</span>
          </li>
        ))}
      </ul>
      <Buttons>
        <Button busy={isSaving} onClick={onSomeoneElse}>
          It is someone else, save
        </Button>
      </Buttons>
    </div>
  );
}
