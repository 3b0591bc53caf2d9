"use client";
import { Tabs as Base } from "@base-ui/react/tabs";
import type { ElementType, ReactNode } from "react";

export interface TabItem {
  value: string;
  label: ReactNode;
  count?: number;
  panel: ReactNode;
}

export interface TabsProps {
  label: string;
  items: readonly TabItem[];
  value?: string;
  defaultValue?: string;
  onValueChange?: (value: string) => void;
}

function Words({ label, count }: { label: ReactNode; count?: number | undefined }) {
  return (
    <>
      {label}
      {count !== undefined && <span className="count">{count}</span>}
    </>
  );
}

/** Panels of one thing on one page. Arrows move along the tabs. */
export function Tabs({ label, items, value, defaultValue, onValueChange }: TabsProps) {
  const which = value === undefined ? { defaultValue: defaultValue ?? items[0]?.value } : { value };
  return (
    <Base.Root {...which} onValueChange={(next) => onValueChange?.(String(next))}>
      <Base.List className="tabline" aria-label={label}>
        {items.map((item) => (
          <Base.Tab key={item.value} value={item.value}>
            <Words label={item.label} count={item.count} />
          </Base.Tab>
        ))}
      </Base.List>
      {items.map((item) => (
        <Base.Panel key={item.value} value={item.value}>
          {item.panel}
        </Base.Panel>
      ))}
    </Base.Root>
  );
}

export interface LinkTab {
  href: string;
  label: ReactNode;
  count?: number;
  current?: boolean;
}

/** Tabs that are pages of their own: links, so that back, bookmarks and new windows work. */
export function LinkTabs({
  label,
  items,
  as: Link = "a",
}: {
  label: string;
  items: readonly LinkTab[];
  as?: ElementType;
}) {
  return (
    <nav className="tabline" aria-label={label}>
      {items.map((item) => (
        <Link key={item.href} href={item.href} aria-current={item.current ? "page" : undefined}>
          <Words label={item.label} count={item.count} />
        </Link>
      ))}
    </nav>
  );
}
