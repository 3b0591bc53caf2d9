"use client";
import { Menu } from "@base-ui/react/menu";
import { WhoAmI, WhoLine } from "@withy/ui/head";
import Link from "next/link";
import { useTransition } from "react";
import { chooseDesk, leave } from "@/server/actions";
import { Appearance } from "./appearance";
import { useShortcuts } from "./shortcuts/shortcut-provider";

export interface PersonProps {
  name: string;
  jobTitle: string;
  practiceName: string;
  deskSiteId: string;
  sites: readonly { id: string; name: string }[];
}

interface Props extends PersonProps {
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

/** Site and person in the head: change desk, reach the rest, sign out. */
export function Person(props: Props) {
  return (
    <WhoAmI>
      <DeskMenu {...props} />
      <PersonMenu {...props} />
    </WhoAmI>
  );
}

function DeskMenu({ deskSiteId, sites, practiceName }: Props) {
  const [, start] = useTransition();
  const here = sites.find((s) => s.id === deskSiteId);
  return (
    <Menu.Root>
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

function PersonMenu({ name, jobTitle, permissions, onKeys, onRecent }: Props) {
  const [, start] = useTransition();
  const { areOn, switchKeys } = useShortcuts();
  return (
    <Menu.Root>
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
            <Menu.Item className="menuitem" onClick={() => start(() => leave())}>
              Sign out
            </Menu.Item>
          </Menu.Popup>
        </Menu.Positioner>
      </Menu.Portal>
    </Menu.Root>
  );
}
