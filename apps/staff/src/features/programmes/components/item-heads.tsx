import type { ProgrammeMode } from "@withy/clinical/programmes/programme";

/** Heads of the columns; each line says the same to readers in its own words. */
export function ItemHeads({ mode }: { mode: ProgrammeMode }) {
  return (
    <div className="item-heads" aria-hidden="true">
      <div className="in soft">
        <span />
        <span />
        <span>Exercise</span>
        <span className="middle">Ladder</span>
        <span>Support</span>
        <span>Needs</span>
        <span className="right">{mode === "timed" ? "work" : "sets"}</span>
        <span className="right">rest</span>
      </div>
    </div>
  );
}
