"use client";
import { CSPProvider } from "@base-ui/react/csp-provider";
import type { ReactNode } from "react";

/** Hands the page's nonce to the primitives, so that the styles they inject pass the policy. */
export function Nonce({ value, children }: { value: string; children: ReactNode }) {
  return <CSPProvider nonce={value}>{children}</CSPProvider>;
}
