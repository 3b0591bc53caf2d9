"use client";
import { findExercise } from "@withy/clinical/exercises/library";
import { ladderPlace } from "@withy/clinical/programmes/ladder";
import type { Programme, ProgrammeItem } from "@withy/clinical/programmes/programme";
import { ladderFrom } from "../draft-changes";
import { LadderMark } from "./ladder-mark";

/** "easier", the ladder, "harder". At an end of the ladder the word stays and says why when pressed. */
export function LadderCell({
  programme,
  item,
  canWrite,
  onClimb,
}: {
  programme: Programme;
  item: ProgrammeItem;
  canWrite: boolean;
  onClimb: (way: "easier" | "harder") => void;
}) {
  const place = ladderPlace(item);
  const name = findExercise(item.exercise)?.name ?? "";
  const step = (way: "easier" | "harder") => {
    const isEnd = !ladderFrom(programme, item, way).ok;
    return (
      <button
        type="button"
        className="linkish"
        aria-disabled={isEnd || undefined}
        aria-label={`${way === "easier" ? "Easier" : "Harder"} form of ${name}`}
        onClick={() => onClimb(way)}
      >
        {way}
      </button>
    );
  };
  return (
    <span className="ladder">
      {canWrite && step("easier")}
      {place && <LadderMark rung={place.rung} rungs={place.rungs} />}
      {canWrite && step("harder")}
    </span>
  );
}
