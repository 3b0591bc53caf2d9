import type { MonthView } from "@withy/contracts/reports";
import { plainDateWords } from "@withy/core/date-words";
import { ButtonLink } from "@withy/ui/button";
import { Glyph } from "@withy/ui/glyph";
import { PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { monthAddress, monthOn } from "../month-address";
import { PrintButton } from "./print-button";
import { SiteChoice } from "./site-choice";

/** "November 2026" with the ways to another month and to one site. */
export function MonthTitle({ month }: { month: MonthView }) {
  const siteId = month.site?.id ?? null;
  const name = plainDateWords(month.firstOn).replace(/^\d+ /, "");
  return (
    <PageTitle
      title={
        <>
          <span className="onlyprint">{month.practiceName}, </span>
          {name}
        </>
      }
      note={
        <span className="steps">
          <ButtonLink size="small" as={Link} href={monthAddress(monthOn(month.month, -1), siteId)}>
            <Glyph name="left" />
            <span className="vh">The month before</span>
          </ButtonLink>
          <ButtonLink size="small" as={Link} href={monthAddress(monthOn(month.month, 1), siteId)}>
            <Glyph name="right" />
            <span className="vh">The next month</span>
          </ButtonLink>
        </span>
      }
      lead={leadWords(month)}
      actions={
        <span className="btns">
          {month.sites.length > 1 && (
            <SiteChoice
              items={[
                { href: monthAddress(month.month, null), label: "All sites", current: siteId === null },
                ...month.sites.map((site) => ({
                  href: monthAddress(month.month, site.id),
                  label: site.name,
                  current: site.id === siteId,
                })),
              ]}
            />
          )}
          <PrintButton />
        </span>
      }
    />
  );
}

function leadWords(month: MonthView): string {
  const where = month.site === null ? "All sites" : month.site.name;
  const when = month.isOver
    ? `as it stands on ${plainDateWords(month.today)}`
    : `not over yet: visits still to come count as booked`;
  return `${where}, ${when}`;
}
