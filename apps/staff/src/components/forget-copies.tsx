"use client";
import { useEffect } from "react";
import { dropAllCopies } from "./unsent-copy";

/** On the page that a sign-out ends at, by whatever way: the browser keeps no text of a note. */
export function ForgetCopies() {
  useEffect(dropAllCopies, []);
  return null;
}
