import type { MonthFigure } from "@withy/contracts/reports";
import { SectionHead } from "@withy/ui/section-head";
import { figureLabels } from "../figure-words";

/** What each figure counts, over what. */
export function Definitions({ figures }: { figures: readonly MonthFigure[] }) {
  return (
    <section aria-labelledby="definitions-title">
      <SectionHead id="definitions-title" title="How each figure is reckoned" />
      <dl className="facts">
        {figures.map((figure) => (
          <Definition key={figure.key} label={figureLabels[figure.key]} words={figure.definition} />
        ))}
      </dl>
    </section>
  );
}

function Definition({ label, words }: { label: string; words: string }) {
  return (
    <>
      <dt>{label}</dt>
      <dd>{words}</dd>
    </>
  );
}
