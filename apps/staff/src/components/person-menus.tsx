"use client";
import { Menu } from "@base-ui/react/menu";
import { WhoLine } from "@withy/ui/head";
import Link from "next/link";
import { useTransition } from "react";
import { chooseDesk, leave } from "@/server/actions";
import { Appearance } from "./appearance";
import { useLeaving } from "./leaving";
import { useShortcuts } from "./shortcuts/shortcut-provider";

export interface PersonProps {
  name: string;
  jobTitle: string;
  practiceName: string;
  deskSiteId: string;
  sites: readonly { id: string; name: string }[];
}

export interface PersonMenuProps extends PersonProps {
  permissions: readonly string[];
  onKeys: () => void;
  onRecent: () => void;
}

const places = [
  { href: "/messages", label: "Messages sent", permission: "messaging.read" },
  { href: "/settings", label: "Settings", permission: "practice.manage" },
  { href: "/settings/audit", label: "Who did what", permission: "audit.read" },
  { href: "/account", label: "Your sign-in", permission: "account.own" },
];

export type WhichMenu = "desk" | "person";

/** The two menus of the head, the asked-for one open at once. */
export function PersonMenus({ open, ...props }: PersonMenuProps & { open: WhichMenu }) {
  return (
    <>
      <DeskMenu {...props} isOpen={open === "desk"} />
      <PersonMenu {...props} isOpen={open === "person"} />
    </>
  );
}

type Props = PersonMenuProps & { isOpen: boolean };

function DeskMenu({ deskSiteId, sites, practiceName, isOpen }: Props) {
  const [, start] = useTransition();
  const here = sites.find((s) => s.id === deskSiteId);
  return (
    <Menu.Root defaultOpen={isOpen}>
      <Menu.Trigger className="whobtn">
        <WhoLine name={here?.name ?? practiceName} under={practiceName} />
      </Menu.Trigger>
      <Menu.Portal>
        <Menu.Positioner sideOffset={6} align="end" className="menupos">
          <Menu.Popup className="menu lifted">
            <Menu.Group>
              <Menu.GroupLabel className="menulabel">Work at</Menu.GroupLabel>
              {sites.map((site) => (
                <Menu.Item
                  key={site.id}
                  className="menuitem"
                  onClick={() => start(() => chooseDesk(site.id))}
                >
                  <span className="grow">{site.name}</span>
                  {site.id === deskSiteId && <span className="soft">here</span>}
                </Menu.Item>
              ))}
            </Menu.Group>
          </Menu.Popup>
        </Menu.Positioner>
      </Menu.Portal>
    </Menu.Root>
  );
}

function PersonMenu({ name, jobTitle, permissions, onKeys, onRecent, isOpen }: Props) {
  const { areOn, switchKeys } = useShortcuts();
  const { leave: signOut, question } = useLeaving(leave);
  return (
    <Menu.Root defaultOpen={isOpen}>
      <Menu.Trigger className="whobtn">
        <WhoLine name={name} under={jobTitle} />
      </Menu.Trigger>
      <Menu.Portal>
        <Menu.Positioner sideOffset={6} align="end" className="menupos">
          <Menu.Popup className="menu lifted">
            {places
              .filter((p) => permissions.includes(p.permission))
              .map((p) => (
                <Menu.Item key={p.href} className="menuitem" render={<Link href={p.href} />}>
                  {p.label}
                </Menu.Item>
              ))}
            <Menu.Separator className="menurule" />
            <Menu.Item className="menuitem" onClick={onRecent}>
              Recent changes
            </Menu.Item>
            <Menu.Item className="menuitem" onClick={onKeys}>
              All keys
            </Menu.Item>
            <Menu.CheckboxItem className="menuitem" checked={areOn} onCheckedChange={switchKeys}>
              <span className="grow">Single-key shortcuts</span>
              <span className="soft">{areOn ? "on" : "off"}</span>
            </Menu.CheckboxItem>
            <Appearance />
            <Menu.Separator className="menurule" />
            <Menu.Item className="menuitem" onClick={signOut}>
              Sign out
            </Menu.Item>
          </Menu.Popup>
        </Menu.Positioner>
      </Menu.Portal>
      {question}
    </Menu.Root>
  );
}
