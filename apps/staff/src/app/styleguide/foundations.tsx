import { Section } from "./section";

const sizes = [
  { size: "39/44", className: "figure", words: "20:00, one figure a screen" },
  { size: "27/36", className: "font-serif text-h1", words: "Tuesday 1 December" },
  { size: "21/28", className: "font-serif text-h2", words: "Gaps to fill" },
  {
    size: "18/28",
    className: "font-serif text-note",
    words: "Stairs easier with the rail. Stiff ten minutes on rising.",
  },
  {
    size: "15/22",
    className: "text-ui",
    words: "Interface: Jonah Petrie, follow-up, Reed. 0O 1lI 5S 8B, 999 314 2786",
  },
  { size: "13/18", className: "text-grid num", words: "Grid and notes to tables: 10:45 to 11:15, £1,234.50" },
  { size: "13/18", className: "note", words: "Margin note: 2 waiting for a time before 10" },
];

const inks = [
  "paper",
  "sheet",
  "ink",
  "soft",
  "rule",
  "hair",
  "primary",
  "link",
  "focus",
  "now",
  "danger",
  "warning",
  "ok",
];

/** Type and ink. */
export function Foundations() {
  return (
    <>
      <Section title="Type" note="Five sizes, two voices">
        {sizes.map((row) => (
          <p key={row.words} className="guide-type">
            <span className="soft small num">{row.size}</span>
            <span className={row.className}>{row.words}</span>
          </p>
        ))}
      </Section>
      <Section
        title="Ink and paper"
        note="Light; dark has its own"
        aside="every text pair is 5:1 or better, every meaningful line 3:1"
      >
        <div className="guide-inks">
          {inks.map((ink) => (
            <div key={ink}>
              <i style={{ background: `var(--${ink})` }} />
              {ink}
            </div>
          ))}
        </div>
      </Section>
    </>
  );
}
