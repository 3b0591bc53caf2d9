"use client";
import type { PutAsideItem } from "@withy/contracts/diary";
import { Key } from "@withy/ui/key";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useTray } from "../hooks/use-put-aside";

const TraySheet = dynamic(() => import("./tray-sheet").then((m) => m.TraySheet));
const ViewsSheet = dynamic(() => import("./views-sheet").then((m) => m.ViewsSheet));

export interface DeskVerbsProps {
  mayBook: boolean;
  /** The view without its day, and the day. */
  address: string;
  day: string | undefined;
  onTakeUp: (item: PutAsideItem) => void;
}

/** At the left of the foot: what was put aside, the views with a name, and paper. */
export function DeskVerbs({ mayBook, address, day, onTakeUp }: DeskVerbsProps) {
  const [sheet, setSheet] = useState<"tray" | "views" | null>(null);
  const tray = useTray(mayBook);
  const newest = tray[0];
  useShortcut("resume", () => newest && onTakeUp(newest), newest !== undefined);
  const close = () => setSheet(null);
  return (
    <span className="footverbs">
      {newest && (
        <span>
          <button type="button" className="linklike" onClick={() => setSheet("tray")}>
            Put aside, {tray.length}
          </button>{" "}
          <Key>U</Key>
        </span>
      )}
      <button type="button" className="linklike" onClick={() => setSheet("views")}>
        Views
      </button>
      <button type="button" className="linklike" onClick={() => window.print()}>
        Print the day
      </button>
      {sheet === "tray" && (
        <TraySheet
          items={tray}
          onClose={close}
          onTakeUp={(item) => {
            close();
            onTakeUp(item);
          }}
        />
      )}
      {sheet === "views" && <ViewsSheet address={address} day={day} onClose={close} />}
    </span>
  );
}
