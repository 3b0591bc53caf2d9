"use client";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { Button } from "@withy/ui/button";
import { useState } from "react";
import { handoutAddress } from "../api-client";

/** Print saves first, so that the paper is never older than the screen. */
export function HandoutBar({
  view,
  send,
  onGive,
}: {
  view: ProgrammeView;
  send: () => Promise<ProgrammeView | null>;
  onGive: () => void;
}) {
  const [isSaving, setSaving] = useState(false);
  const print = async () => {
    setSaving(true);
    const saved = view.canWrite ? await send() : view;
    setSaving(false);
    if (saved) window.open(handoutAddress(saved.id, saved.versionNumber), "_blank", "noopener");
  };
  return (
    <div className="paper-bar">
      <b>Handout</b>
      <span className="grow" />
      <Button busy={isSaving} onClick={() => void print()}>
        {view.isIssued ? "Print" : "Print a draft"}
      </Button>
      {view.canWrite && !view.isIssued && (
        <Button kind="primary" onClick={onGive}>
          Give to {view.calledName}…
        </Button>
      )}
    </div>
  );
}
