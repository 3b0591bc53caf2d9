"use client";
import { createContext, type ReactNode, useContext } from "react";

const Context = createContext<string | null>(null);

/** Who is signed in, for what a browser keeps for one person. */
export function PersonId({ id, children }: { id: string; children: ReactNode }) {
  return <Context value={id}>{children}</Context>;
}

export function usePersonId(): string {
  const id = useContext(Context);
  if (id === null) throw new Error("usePersonId needs a PersonId above it.");
  return id;
}
