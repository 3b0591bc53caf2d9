"use client";
import { Button } from "@withy/ui/button";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";

interface Props {
  id: string;
  label: string;
  hint: string;
  value: string;
}

/** A secret that is shown this once, to be copied. */
export function SecretOnce({ id, label, hint, value }: Props) {
  const [said, setSaid] = useState("");
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(value);
      setSaid("Copied.");
    } catch {
      setSaid("The browser did not allow it. Select the text and copy it by hand.");
    }
  };
  return (
    <div className="secretonce">
      <TextInput
        id={id}
        label={label}
        hint={hint}
        value={value}
        readOnly
        spellCheck={false}
        onFocus={(event) => event.currentTarget.select()}
      />
      <Button onClick={() => void copy()}>Copy it</Button>
      <span className="soft" role="status">
        {said}
      </span>
    </div>
  );
}
