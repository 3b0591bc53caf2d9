"use client";
import { Button } from "@withy/ui/button";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { fieldProblem } from "@/api/form-problems";
import type { LetterDraftHandle } from "../hooks/use-letter-draft";

/** Whom the letter is to, as it stands in the envelope's window; opened where it must be changed. */
export function RecipientFields({ handle }: { handle: LetterDraftHandle }) {
  const { draft, change, error } = handle;
  const { name, address, email } = draft.recipient;
  const [isOpen, setIsOpen] = useState(name === "");
  const isWrong = ["name", "addressLines", "email"].some((part) => fieldProblem(error, `recipient.${part}`));
  const set = (part: Partial<typeof draft.recipient>) =>
    change({ ...draft, recipient: { ...draft.recipient, ...part } });
  if (!isOpen && !isWrong) {
    return (
      <div>
        <p className="letter-address">{`${name}\n${address}`}</p>
        <p className="small soft">
          {email || "no e-mail address"}{" "}
          <Button kind="plain" size="small" onClick={() => setIsOpen(true)}>
            Change<span className="vh"> who the letter is to</span>
          </Button>
        </p>
      </div>
    );
  }
  return (
    <div className="letter-recipient">
      <TextInput
        id="recipient-name"
        label="To"
        value={name}
        error={fieldProblem(error, "recipient.name")}
        onChange={(event) => set({ name: event.target.value })}
      />
      <TextArea
        id="recipient-address"
        label="Address"
        rows={4}
        value={address}
        error={fieldProblem(error, "recipient.addressLines")}
        onChange={(event) => set({ address: event.target.value })}
      />
      <TextInput
        id="recipient-email"
        label="E-mail for the private link"
        type="email"
        value={email}
        error={fieldProblem(error, "recipient.email")}
        onChange={(event) => set({ email: event.target.value })}
      />
      {!isWrong && (
        <Button size="small" onClick={() => setIsOpen(false)}>
          Done
        </Button>
      )}
    </div>
  );
}
