import { Book, Head } from "@withy/ui/head";
import { Page, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Controls } from "./controls";
import { Foundations } from "./foundations";
import { Messages } from "./messages";
import { Records } from "./records";
import { States } from "./states";
import "./styleguide.css";

export const metadata: Metadata = { title: "Style sheet" };

const densities = ["compact", "regular", "touch"] as const;

/** Every part on one page, to look at while building. In production it answers as if it were not there. */
export default function StyleguidePage() {
  if (process.env.NODE_ENV === "production" && process.env.WITHY_STYLEGUIDE !== "1") notFound();
  return (
    <Book>
      <Head homeHref="/styleguide" />
      <Page>
        <PageTitle title="Style sheet" note="Read the margin first" lead="Ruled paper and ink." />
        <div data-theme="light" className="specimen">
          <Foundations />
          <States />
          <Controls prefix="light" />
          <Records prefix="light" />
          <Messages prefix="light" />
        </div>
        <div data-theme="dark" className="specimen">
          <h2 className="specimen-name">The same, after dark</h2>
          <States />
          <Controls prefix="dark" />
          <Records prefix="dark" />
          <Messages prefix="dark" />
        </div>
        {densities.map((density) => (
          <div key={density} data-density={density} className="specimen">
            <h2 className="specimen-name">Density: {density}</h2>
            <Records prefix={density} />
            <Controls prefix={density} />
          </div>
        ))}
      </Page>
    </Book>
  );
}
