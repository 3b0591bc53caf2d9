import type { LetterView } from "@withy/contracts/letters";
import { Glyph } from "@withy/ui/glyph";

export function LetterChecks({ letter }: { letter: LetterView }) {
  return (
    <ul className="letter-checks">
      {letter.checks.map((check) => (
        <li key={check.key} data-ok={check.isOk ? "" : undefined}>
          <Glyph name={check.isOk ? "tick" : "warn"} />
          <span>
            {!check.isOk && <span className="vh">{check.blocks ? "Put right first: " : "Look at: "}</span>}
            {check.words}
          </span>
        </li>
      ))}
    </ul>
  );
}
