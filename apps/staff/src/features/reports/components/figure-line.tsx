import type { MonthView } from "@withy/contracts/reports";
import { changeWords, figureLabels, figureWords, hundredthsWords, madeOfWords } from "../figure-words";
import { Opens } from "./figure-sheet";

/** The month in one line of figures: each opens, says what it is out of, and how it moved. */
export function FigureLine({ month }: { month: MonthView }) {
  return (
    <dl className="figline">
      {month.figures.map((figure) => (
        <div key={figure.key}>
          <dt>{figureLabels[figure.key]}</dt>
          <dd>
            <span className="big">
              <Opens asked={{ figure: figure.key }}>{figureWords(figure)}</Opens>
            </span>
            <span>
              {figure.key === "new-patients" ? (
                `${hundredthsWords(month.visitsPerNewPatient)} visits for each`
              ) : figure.of === null ? (
                madeOfWords(figure)
              ) : (
                <Opens asked={{ figure: figure.of }}>{madeOfWords(figure)}</Opens>
              )}
            </span>
            <span className="soft">{besideWords(month, figure.key) ?? changeWords(figure)}</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}

function besideWords(month: MonthView, key: string): string | null {
  if (key === "booked") {
    const booked = month.figures.find((figure) => figure.key === "booked");
    return booked ? `${changeWords(booked)}, target ${month.targetPercent}` : null;
  }
  return key === "cancelled" ? `${month.lateCancellations} of them late` : null;
}
