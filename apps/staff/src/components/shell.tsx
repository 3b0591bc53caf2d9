"use client";
import { Book, Head, SectionTabs, SeekButton, ThumbBar } from "@withy/ui/head";
import dynamic from "next/dynamic";
import Link from "next/link";
import { usePathname } from "next/navigation";
import { type ReactNode, useState } from "react";
import { Person, type PersonProps } from "./person";
import { sectionsFor, thumbsFor } from "./sections";
import { useShortcut } from "./shortcuts/shortcut-provider";

const Palette = dynamic(() => import("./palette").then((m) => m.Palette));
const KeySheet = dynamic(() => import("./key-sheet").then((m) => m.KeySheet));
const RecentSheet = dynamic(() => import("./recent-sheet").then((m) => m.RecentSheet));

export interface ShellProps extends PersonProps {
  permissions: readonly string[];
  counts: Readonly<Record<string, number>>;
  children: ReactNode;
}

type Sheet = "palette" | "keys" | "recent" | null;

/** Head, search, palette and help around every signed-in page. */
export function Shell({ permissions, counts, children, ...person }: ShellProps) {
  const path = usePathname();
  const [sheet, setSheet] = useState<Sheet>(null);
  useShortcut("palette", () => setSheet("palette"));
  useShortcut("search", () => setSheet("palette"));
  useShortcut("help", () => setSheet("keys"));
  useShortcut("recent", () => setSheet("recent"));
  const close = () => setSheet(null);
  return (
    <Book>
      <Head homeHref="/" as={Link}>
        <SectionTabs items={sectionsFor(permissions, path, counts)} as={Link} />
        <SeekButton onClick={() => setSheet("palette")}>Patient, phone, NHS or invoice number</SeekButton>
        <Person
          {...person}
          onKeys={() => setSheet("keys")}
          onRecent={() => setSheet("recent")}
          permissions={permissions}
        />
      </Head>
      {children}
      <ThumbBar items={thumbsFor(permissions, path)} as={Link} />
      {sheet === "palette" && <Palette permissions={permissions} onClose={close} />}
      {sheet === "keys" && <KeySheet permissions={permissions} onClose={close} />}
      {sheet === "recent" && <RecentSheet onClose={close} />}
    </Book>
  );
}
