"use client";
import { Tray } from "@withy/ui/tray";
import dynamic from "next/dynamic";
import { type ReactNode, useState } from "react";
import { useSiteChanges } from "../hooks/use-site-changes";

const ChangesSheet = dynamic(() => import("./changes-sheet").then((m) => m.ChangesSheet));

/** The strip at the foot: what was last done at these sites, and the list that it can be undone from. */
export function DiaryFoot(props: { siteIds: readonly string[]; canUndo: boolean; children?: ReactNode }) {
  const { siteIds, canUndo, children } = props;
  const [isOpen, setIsOpen] = useState(false);
  const answer = useSiteChanges(siteIds).data;
  const changes = answer ?? [];
  const last = changes[0];
  return (
    <Tray
      said={
        <>
          {last && `${last.time} ${last.byName} ${last.what}. `}
          {answer?.length === 0 && "Nothing was changed here yet. "}
          <button type="button" className="linklike" onClick={() => setIsOpen(true)}>
            Recent changes
          </button>
        </>
      }
    >
      {children}
      {isOpen && <ChangesSheet changes={changes} canUndo={canUndo} onClose={() => setIsOpen(false)} />}
    </Tray>
  );
}
