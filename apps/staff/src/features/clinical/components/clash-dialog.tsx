"use client";
import type { NoteView } from "@withy/contracts/clinical";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import type { NoteDraft } from "../hooks/use-note-draft";
import { clockAt } from "../site-time";
import { bothTexts, differingHeadings } from "../two-texts";

/** The note was changed in two places. Both texts, heading by heading; nothing is lost whatever is chosen. */
export function ClashDialog({
  note,
  draft,
  onClose,
}: {
  note: NoteView;
  draft: NoteDraft;
  onClose: () => void;
}) {
  const { clash, keeper } = draft;
  if (!clash) return null;
  const { theirs, mine } = clash;
  const settle = (body: Readonly<Record<string, string>>) => {
    keeper.settle(body);
    onClose();
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      size="wide"
      title="This note was changed somewhere else too"
      lead={`The other text was saved at ${clockAt(theirs.savedAt, note.zone)}, perhaps from another window of yours. Choose what goes on; the other text stays in the note's history.`}
      closeLabel="Decide later"
      actions={
        <>
          <Button kind="primary" onClick={() => settle(bothTexts(note.kind, mine, theirs.body))}>
            Keep both, one after the other
          </Button>
          <Button onClick={() => settle(mine)}>Keep this page's text</Button>
          <Button onClick={() => settle(theirs.body)}>Take the other text</Button>
        </>
      }
    >
      <table className="clash acc">
        <caption className="vh">Headings that differ</caption>
        <thead>
          <tr>
            <th scope="col">Heading</th>
            <th scope="col">This page</th>
            <th scope="col">The other text</th>
          </tr>
        </thead>
        <tbody>
          {differingHeadings(note.kind, mine, theirs.body).map(({ key, label }) => (
            <tr key={key}>
              <th scope="row">{label}</th>
              <td className="serif">{mine[key] ?? <span className="soft">empty</span>}</td>
              <td className="serif">{theirs.body[key] ?? <span className="soft">empty</span>}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </Dialog>
  );
}
