import type { HeatView } from "@withy/contracts/reports";
import { SectionHead } from "@withy/ui/section-head";

const weekdays = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday"];
const steps = [
  { className: "q1", from: 0, words: "under 45" },
  { className: "q2", from: 45, words: "45 to 59" },
  { className: "q3", from: 60, words: "60 to 74" },
  { className: "q4", from: 75, words: "75 to 89" },
  { className: "q5", from: 90, words: "90 and over" },
];

const two = (hour: number) => String(hour).padStart(2, "0");
const stepOf = (percent: number) => steps.findLast((step) => percent >= step.from)?.className ?? "q1";

/** When we are full: percent booked, weekday by hour, the number in every cell. */
export function HeatTable({ heat, where }: { heat: HeatView; where: string }) {
  const said = fullestWords(heat);
  return (
    <section aria-labelledby="heat-title">
      <SectionHead
        id="heat-title"
        title="When we are full"
        aside={`percent booked, weekday by hour, ${where}`}
      />
      {heat.rows.length === 0 ? (
        <p className="soft">No hours were on offer, so there is no data.</p>
      ) : (
        <>
          {/* biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls sideways must be reached by keys */}
          <section className="heatscroll" aria-label="Hours of the week" tabIndex={0}>
            <table className="heat">
              <caption className="vh">Percent booked by weekday and hour</caption>
              <thead>
                <tr>
                  <td />
                  {heat.hours.map((hour) => (
                    <th key={hour} scope="col">
                      {two(hour)}
                    </th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {heat.rows.map((row) => (
                  <tr key={row.weekday}>
                    <th scope="row">{weekdays[row.weekday - 1]?.slice(0, 3)}</th>
                    {row.percent.map((percent, i) => (
                      <td key={heat.hours[i]} className={percent === null ? "closed" : stepOf(percent)}>
                        {percent === null ? <span className="vh">closed</span> : percent}
                      </td>
                    ))}
                  </tr>
                ))}
              </tbody>
            </table>
          </section>
          <p className="heatkey soft" aria-hidden="true">
            {steps.map((step) => (
              <span key={step.className}>
                <i className={step.className} />
                {step.words}
              </span>
            ))}
            <span>
              <i className="closed" />
              closed
            </span>
          </p>
          {said && <p className="heatsaid">{said}</p>}
        </>
      )}
    </section>
  );
}

/** The fullest and the emptiest hour in one sentence. */
function fullestWords(heat: HeatView): string | null {
  const cells = heat.rows.flatMap((row) =>
    row.percent.flatMap((percent, i) =>
      percent === null
        ? []
        : [{ percent, words: `${weekdays[row.weekday - 1]} ${two(heat.hours[i] ?? 0)}:00` }],
    ),
  );
  const sorted = cells.toSorted((a, b) => b.percent - a.percent);
  const [most, least] = [sorted[0], sorted.at(-1)];
  if (!most || !least || most.percent === least.percent) return null;
  return `${most.words} is the fullest hour at ${most.percent}%; ${least.words} the emptiest at ${least.percent}%.`;
}
