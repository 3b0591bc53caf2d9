import type { LetterSection } from "@withy/contracts/letters";
import { letterActors } from "@withy/contracts/letters/headings";
import { actorWords } from "../letter-words";

/** The plan again by who has to act, so that nobody's part is overlooked. */
export function WhoDoesWhat({ sections }: { sections: readonly LetterSection[] }) {
  const actions = sections
    .filter((section) => section.key === "plan")
    .flatMap((section) => section.sentences)
    .filter((sentence) => sentence.text !== "");
  if (actions.length === 0)
    return <p className="soft">Nothing yet. Add a sentence under Plan and requested actions.</p>;
  const ordered = [...letterActors].flatMap((actor) =>
    actions.filter((action) => (action.actor ?? "practice") === actor),
  );
  return (
    <dl className="letter-who">
      {ordered.map((action) => (
        <div key={action.id}>
          <dt>{actorWords[action.actor ?? "practice"]}</dt>
          <dd>{action.text}</dd>
        </div>
      ))}
    </dl>
  );
}
