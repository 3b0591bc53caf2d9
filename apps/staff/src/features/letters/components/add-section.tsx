"use client";
import { type LetterSectionKey, letterHeadings } from "@withy/contracts/letters/headings";
import { Select } from "@withy/ui/select";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";
import { absentSections, withNewSentence } from "../letter-draft";

/** Puts in a heading of the outpatient letter standard that the record had nothing for. */
export function AddSection({ handle }: { handle: LetterDraftHandle }) {
  const absent = absentSections(handle.draft);
  if (absent.length === 0) return null;
  const add = (key: string) => {
    const known = absent.find((one): one is LetterSectionKey => one === key);
    if (!known) return;
    handle.change(withNewSentence(handle.draft, known, `new-${crypto.randomUUID()}`));
    requestAnimationFrame(() => document.getElementById(`sentence-${known}-0`)?.focus());
  };
  return (
    <div className="letter-heading-choice">
      <Select
        id="add-heading"
        label="Add a heading"
        placeholder="Choose a heading"
        value=""
        options={absent.map((key) => ({ value: key, label: letterHeadings[key] }))}
        onChange={(event) => add(event.target.value)}
      />
    </div>
  );
}
