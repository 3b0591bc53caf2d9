"use client";
import { type ChoiceLink, ChoiceLinks } from "@withy/ui/choice";
import Link from "next/link";

/** All sites or one of them, each a page of its own. */
export function SiteChoice({ items }: { items: readonly ChoiceLink[] }) {
  return <ChoiceLinks label="Sites" items={items} as={Link} />;
}
