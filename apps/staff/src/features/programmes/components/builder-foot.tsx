"use client";
import { sessionTime } from "@withy/clinical/programmes/compute-time";
import { startTimes } from "@withy/clinical/programmes/equation";
import { defaultPainBands } from "@withy/clinical/programmes/pain-bands";
import type { Programme } from "@withy/clinical/programmes/programme";
import { clockDuration } from "@withy/core/date-words";
import { Button } from "@withy/ui/button";
import { Glyph } from "@withy/ui/glyph";
import type { BuilderSheet } from "../item-actions";

function endWords(programme: Programme): string {
  const end = clockDuration(sessionTime(programme).elapsedSeconds);
  if (programme.items.length === 0) return "Nothing here yet. Add the first exercise.";
  if (programme.mode === "sets" || programme.rounds === 1) return `ends ${end}`;
  return programme.rounds === 2
    ? `round 2, the same again, ends ${end}`
    : `${programme.rounds} rounds, ends ${end}`;
}

/** Under the lines: where the first round ends, what to add, and the usual care. */
export function BuilderFoot({
  programme,
  canWrite,
  onOpen,
}: {
  programme: Programme;
  canWrite: boolean;
  onOpen: (sheet: BuilderSheet) => void;
}) {
  const end = startTimes(programme).at(-1) ?? 0;
  return (
    <>
      <div className="after-items">
        <span className="gut num tick">{clockDuration(end).replace(/^0/, "")}</span>
        <div className="in">
          <em className="serif">{endWords(programme)}</em>
          <span className="grow" />
          {canWrite && (
            <span className="btns">
              <Button size="small" shortcut="N" onClick={() => onOpen("add")}>
                Add an exercise
              </Button>
              <Button size="small" onClick={() => onOpen("equipment")}>
                Equipment at home
              </Button>
              <Button size="small" onClick={() => onOpen("session")}>
                Name, timing and advice
              </Button>
            </span>
          )}
        </div>
      </div>
      <p className="usual-care">
        <Glyph name="warn" /> <b>Usual care:</b> keep pain at {defaultPainBands.acceptableTo} of 10 or under,
        settled by next morning; step down after two worse mornings. Local policy and your judgement come
        first.
      </p>
    </>
  );
}
