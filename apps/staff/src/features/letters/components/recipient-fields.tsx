"use client";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { fieldProblem } from "@/api/form-problems";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";

/** Whom the letter is to, as it stands in the envelope's window. */
export function RecipientFields({ handle }: { handle: LetterDraftHandle }) {
  const { draft, change, error } = handle;
  const set = (part: Partial<typeof draft.recipient>) =>
    change({ ...draft, recipient: { ...draft.recipient, ...part } });
  return (
    <div className="letter-recipient">
      <TextInput
        id="recipient-name"
        label="To"
        value={draft.recipient.name}
        error={fieldProblem(error, "recipient.name")}
        onChange={(event) => set({ name: event.target.value })}
      />
      <TextArea
        id="recipient-address"
        label="Address"
        rows={4}
        value={draft.recipient.address}
        error={fieldProblem(error, "recipient.addressLines")}
        onChange={(event) => set({ address: event.target.value })}
      />
      <TextInput
        id="recipient-email"
        label="E-mail for the private link"
        type="email"
        value={draft.recipient.email}
        error={fieldProblem(error, "recipient.email")}
        onChange={(event) => set({ email: event.target.value })}
      />
    </div>
  );
}
