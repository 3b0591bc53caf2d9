import type { ElementType, ReactNode } from "react";
import { Glyph } from "./glyph";
import { Key } from "./key";
import { Mark } from "./mark";

/** The whole book: head above, page below, margin lines through both. */
export function Book({ children }: { children: ReactNode }) {
  return (
    <div className="book">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      {children}
    </div>
  );
}

export interface HeadProps {
  homeHref: string;
  /** `SectionTabs`, then `SeekButton`, then `WhoAmI`. */
  children?: ReactNode;
  as?: ElementType;
}

export function Head({ homeHref, children, as: Link = "a" }: HeadProps) {
  return (
    <header className="head">
      <Link className="mark" href={homeHref}>
        <Mark />
        <span className="name">Withy</span>
      </Link>
      {children}
    </header>
  );
}

export interface SectionTab {
  href: string;
  label: string;
  count?: number;
  current?: boolean;
}

/** The sections stand in the head like an index; the one that is open runs into the sheet. */
export function SectionTabs({ items, as: Link = "a" }: { items: readonly SectionTab[]; as?: ElementType }) {
  return (
    <nav className="sections" aria-label="Sections">
      {items.map((item) => (
        <Link key={item.href} href={item.href} aria-current={item.current ? "page" : undefined}>
          {item.label}
          {item.count !== undefined && item.count > 0 && <sup>{item.count}</sup>}
        </Link>
      ))}
    </nav>
  );
}

/** Opens the search; looks like the line one would write on. */
export function SeekButton({
  children,
  shortcut = "/",
  onClick,
}: {
  children: ReactNode;
  shortcut?: string;
  onClick: () => void;
}) {
  return (
    <button type="button" className="seek" onClick={onClick}>
      <Glyph name="find" />
      <span className="text">{children}</span>
      <Key>{shortcut}</Key>
    </button>
  );
}

/** Where I am and who I am, always in sight. */
export function WhoAmI({ children }: { children: ReactNode }) {
  return <div className="whoami">{children}</div>;
}

export function WhoLine({ name, under }: { name: ReactNode; under?: ReactNode }) {
  return (
    <span>
      <b>{name}</b>
      {under}
    </span>
  );
}

export interface ThumbItem {
  href: string;
  label: string;
  current?: boolean;
  /** The one thing that is done most often here. */
  main?: boolean;
}

/** The sections again, at the thumb, on a phone. */
export function ThumbBar({ items, as: Link = "a" }: { items: readonly ThumbItem[]; as?: ElementType }) {
  return (
    <nav className="thumbbar" aria-label="Sections at hand">
      {items.map((item) => (
        <Link
          key={item.href}
          href={item.href}
          aria-current={item.current ? "page" : undefined}
          data-do={item.main ? "" : undefined}
        >
          {item.label}
        </Link>
      ))}
    </nav>
  );
}
