import type { InvoiceStepView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";

/** Every step in the invoice's life, in the margin. */
export function InvoiceHistory({ steps, today }: { steps: readonly InvoiceStepView[]; today: string }) {
  return (
    <section className="history" aria-labelledby="history-title">
      <h2 id="history-title" className="note">
        Every step, oldest first
      </h2>
      <ol>
        {steps.map((step) => (
          <li key={step.id}>
            <span className="d num">{shortDate(step.on, today)}</span>
            <span className="note said">{step.said}</span>
            {(step.time !== null || step.by !== null) && (
              <span className="by num">{[step.time, step.by].filter(Boolean).join(", ")}</span>
            )}
          </li>
        ))}
      </ol>
    </section>
  );
}
