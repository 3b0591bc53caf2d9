import type { ProgrammeView } from "@withy/contracts/programmes";
import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/wall-clock";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { handoutAddress } from "../api-client";

/** Every version that there was; one that was given out can be looked at and printed again as it was. */
export function VersionLines({ view }: { view: ProgrammeView }) {
  const day = (at: string) => plainDateWords(dayOf(new Date(at), view.zone));
  const here = `/exercises/programmes/${view.id}`;
  return (
    <section className="versions" aria-labelledby="versions">
      <SectionHead title="Versions" id="versions" />
      <ul>
        {view.versions.map((line) => (
          <li key={line.versionNumber}>
            <b className="num">Version {line.versionNumber}</b>
            <span>
              {line.issuedAt
                ? `given out ${day(line.issuedAt)} by ${line.issuedBy}`
                : `saved ${day(line.savedAt)} by ${line.savedBy}, not given out`}
            </span>
            {line.versionNumber === view.versionNumber ? (
              <span className="soft">on this page</span>
            ) : (
              <Link
                href={
                  line.versionNumber === view.currentVersion ? here : `${here}?version=${line.versionNumber}`
                }
              >
                Look<span className="vh"> at version {line.versionNumber}</span>
              </Link>
            )}
            <a href={handoutAddress(view.id, line.versionNumber)} target="_blank" rel="noreferrer">
              Print<span className="vh"> version {line.versionNumber}, opens a PDF</span>
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}
