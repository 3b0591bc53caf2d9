"use client";
import type { ListFigureRowsInput } from "@withy/contracts/reports";
import dynamic from "next/dynamic";
import { createContext, type ReactNode, useContext, useState } from "react";
import type { FigureAsked } from "./figure-asked";

const RowsDialog = dynamic(() => import("./rows-dialog").then((m) => m.RowsDialog), { ssr: false });

const Opening = createContext<(asked: FigureAsked) => void>(() => {});

/** Lets every figure of the month open the rows it is made of, in one sheet. */
export function FigureSheet({
  month,
  siteId,
  children,
}: {
  month: string;
  siteId: string | null;
  children: ReactNode;
}) {
  const [asked, setAsked] = useState<FigureAsked | null>(null);
  return (
    <Opening value={setAsked}>
      {children}
      {asked && (
        <RowsDialog
          key={JSON.stringify(asked)}
          asked={asked}
          input={inputFor(month, siteId, asked)}
          onClose={() => setAsked(null)}
        />
      )}
    </Opening>
  );
}

function inputFor(month: string, siteId: string | null, asked: FigureAsked): ListFigureRowsInput {
  const { who: _, siteId: own, ...rest } = asked;
  const site = own ?? siteId;
  return { month, ...rest, ...(site === null ? {} : { siteId: site }) };
}

/** A figure on the page: pressing it shows its rows. */
export function Opens({ asked, children }: { asked: FigureAsked; children: ReactNode }) {
  const open = useContext(Opening);
  return (
    <button type="button" className="opens" onClick={() => open(asked)}>
      {children}
    </button>
  );
}
