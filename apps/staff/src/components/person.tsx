"use client";
import { WhoAmI, WhoLine } from "@withy/ui/head";
import dynamic from "next/dynamic";
import { useState } from "react";
import type { PersonMenuProps, WhichMenu } from "./person-menus";

export type { PersonProps } from "./person-menus";

const load = () => import("./person-menus").then((m) => m.PersonMenus);

/** Site and person in the head: change desk, reach the rest, sign out. The menus load when one is first wanted. */
export function Person(props: PersonMenuProps) {
  const [open, setOpen] = useState<WhichMenu | null>(null);
  return <WhoAmI>{open ? <Menus {...props} open={open} /> : <Closed {...props} onOpen={setOpen} />}</WhoAmI>;
}

const Menus = dynamic(load);

function Closed(props: PersonMenuProps & { onOpen: (which: WhichMenu) => void }) {
  const { sites, deskSiteId, practiceName, name, jobTitle, onOpen } = props;
  const here = sites.find((site) => site.id === deskSiteId);
  const ahead = () => void load();
  return (
    <>
      <ClosedMenu
        name={here?.name ?? practiceName}
        under={practiceName}
        onWarm={ahead}
        onOpen={() => onOpen("desk")}
      />
      <ClosedMenu name={name} under={jobTitle} onWarm={ahead} onOpen={() => onOpen("person")} />
    </>
  );
}

interface ClosedMenuProps {
  name: string;
  under: string;
  onWarm: () => void;
  onOpen: () => void;
}

function ClosedMenu({ name, under, onWarm, onOpen }: ClosedMenuProps) {
  return (
    <button
      type="button"
      className="whobtn"
      aria-haspopup="menu"
      aria-expanded={false}
      onPointerEnter={onWarm}
      onFocus={onWarm}
      onClick={onOpen}
    >
      <WhoLine name={name} under={under} />
    </button>
  );
}
