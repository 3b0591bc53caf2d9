import "../exercises.css";
import { type Range, supportWords } from "@withy/clinical/exercises/exercise";
import type { ExerciseView } from "@withy/contracts/programmes";
import { AlertLine } from "@withy/ui/alert-line";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { Fragment, type ReactNode } from "react";
import { ExerciseFigure } from "./exercise-figure";
import { ExerciseLadder } from "./exercise-ladder";

const range = ([low, high]: Range, unit = "") =>
  low === high ? `${low}${unit}` : `${low} to ${high}${unit}`;

/** Everything about one exercise on one sheet, as it can be read to a patient. */
export function ExerciseSheet({ exercise }: { exercise: ExerciseView }) {
  return (
    <div className="exercise-sheet">
      <div className="drawings">
        <ExerciseFigure
          figure={exercise.figure}
          of="start"
          size={210}
          title={`${exercise.name}: starting position`}
        />
        <ExerciseFigure
          figure={exercise.figure}
          size={210}
          title={`${exercise.name}: movement over the dotted start`}
        />
      </div>
      <section className="how" aria-labelledby="how">
        <SectionHead title="How to do it" id="how" />
        <p className="purpose serif">{exercise.purpose}</p>
        <p>
          <b>Start.</b> {exercise.start}
        </p>
        <ol>
          {exercise.steps.map((step) => (
            <li key={step}>{step}</li>
          ))}
        </ol>
      </section>
      <section className="care" aria-labelledby="care">
        <SectionHead title="Usual cautions" id="care" />
        {exercise.cautions.map((caution) => (
          <AlertLine key={caution}>{caution}</AlertLine>
        ))}
        <p className="small soft">Local policy and the clinician's judgement come first.</p>
      </section>
      <section className="ladder" aria-labelledby="ladder">
        <SectionHead title="Ladder, easiest first" id="ladder" />
        <ExerciseLadder exercise={exercise} />
      </section>
      <section className="dose" aria-labelledby="facts">
        <SectionHead title="Dose and support" id="facts" />
        <Facts exercise={exercise} />
      </section>
    </div>
  );
}

function Facts({ exercise }: { exercise: ExerciseView }) {
  const { dose, withoutEquipment } = exercise;
  const facts: [string, ReactNode][] = [
    ["Timed", `${range(dose.workSeconds, " s")} of work`],
    ["Sets", `${range(dose.sets)} of ${range(dose.repetitions)}`],
    ...(dose.holdSeconds[1] > 0 ? [["Hold", range(dose.holdSeconds, " s")] as [string, string]] : []),
    ["Works", exercise.muscles.join(", ")],
    ["Sides", exercise.sides === "together" ? "both together" : "one at a time, counted for each side"],
    ["Support", `${exercise.supports.map((support) => supportWords[support]).join(", ")}, or any other`],
    ...(withoutEquipment === null
      ? []
      : [
          [
            "With nothing at home",
            <Link key="instead" href={`/exercises/${withoutEquipment.exercise}`}>
              {exercise.alternativeName}
            </Link>,
          ] as [string, ReactNode],
        ]),
  ];
  return (
    <dl className="facts">
      {facts.map(([name, value]) => (
        <Fragment key={name}>
          <dt>{name}</dt>
          <dd className="num">{value}</dd>
        </Fragment>
      ))}
    </dl>
  );
}
