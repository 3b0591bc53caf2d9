"use client";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { useState } from "react";
import { useIssueProgramme } from "../hooks/use-issue-programme";

/** Gives the version out. What is typed is saved first, so that the paper is what the screen shows. */
export function IssueDialog({
  view,
  send,
  onIssued,
  onClose,
}: {
  view: ProgrammeView;
  send: () => Promise<ProgrammeView | null>;
  onIssued: (view: ProgrammeView) => void;
  onClose: () => void;
}) {
  const issue = useIssueProgramme();
  const [unsaved, setUnsaved] = useState(false);
  const give = async () => {
    const saved = await send();
    setUnsaved(saved === null);
    if (saved) issue.mutate({ programmeId: saved.id, version: saved.version }, { onSuccess: onIssued });
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Give these exercises to ${view.calledName}`}
      lead="This version then stays as it is. You can go on building: the first change begins the next version."
      actions={
        <Button kind="primary" busy={issue.isPending} onClick={() => void give()}>
          Give and print
        </Button>
      }
    >
      {unsaved && (
        <AlertLine tone="danger" live>
          The last changes are not saved yet. Close this, look at the message above the lines, and try again.
        </AlertLine>
      )}
      {issue.error && (
        <AlertLine tone="danger" live>
          {issue.error.message}
        </AlertLine>
      )}
      <p>The handout opens as a PDF to print or to send. The record keeps who gave it and when.</p>
    </Dialog>
  );
}
