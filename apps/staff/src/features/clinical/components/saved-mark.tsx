import { Glyph } from "@withy/ui/glyph";
import type { DraftView } from "../note-keeper";
import { clockAt } from "../site-time";

/** When the text was last saved, always in sight. Readers are told of trouble, not of every save. */
export function SavedMark({ draft, zone }: { draft: DraftView; zone: string }) {
  const { state, savedAt, failure } = draft;
  const isTrouble = state === "kept-here" || state === "not-kept" || state === "clash";
  return (
    <span className="saved small num" data-trouble={isTrouble ? "" : undefined}>
      <span role="status">
        {state === "kept-here" && `Not saved, kept on this device. ${failure ?? ""}`}
        {state === "not-kept" && `Not saved. Keep this page open. ${failure ?? ""}`}
        {state === "clash" && "Not saved: changed somewhere else too"}
      </span>
      {state === "saving" && "Saving"}
      {state === "typing" && `Saved ${clockAt(savedAt, zone)}, writing`}
      {state === "saved" && (
        <>
          <Glyph name="tick" />
          Saved {clockAt(savedAt, zone)}
        </>
      )}
    </span>
  );
}
