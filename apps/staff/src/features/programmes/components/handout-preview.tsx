import { handout } from "@withy/clinical/programmes/handout";
import type { Programme } from "@withy/clinical/programmes/programme";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { ExerciseFigure } from "./exercise-figure";

/** What the patient will hold, beside what is being built; words and drawings are those of the paper. */
export function HandoutPreview({ view, programme }: { view: ProgrammeView; programme: Programme }) {
  const paper = handout(programme, view.calledName);
  return (
    <article className="handout" aria-label="Preview of the handout">
      <header>
        <span className="practice">{view.sender.practice}</span>
        <span className="small soft num">
          {view.sender.site}, {view.sender.phone}
        </span>
      </header>
      <h2>{paper.title}</h2>
      <p className="session">{paper.summary}</p>
      <ol>
        {paper.entries.map((entry) => (
          <li key={entry.number}>
            <span className="drawings">
              <ExerciseFigure figure={entry.figure} of="start" size={76} />
              <ExerciseFigure figure={entry.figure} size={76} />
            </span>
            <div>
              <b>
                <span className="num">{entry.number}</span> {entry.title}
              </b>
              <p>
                {entry.start} {entry.steps.join(" ")} {entry.how}
              </p>
              <p className="small soft">
                {[entry.dose, entry.hold, entry.note].filter((words) => words).join(" ")}
              </p>
            </div>
          </li>
        ))}
      </ol>
      {paper.advice !== "" && <p className="advice">{paper.advice}</p>}
      <p className="care">
        <b>{paper.careTitle}</b> {paper.care}
      </p>
    </article>
  );
}
