"use client";
import { useSyncExternalStore } from "react";

const never = () => () => {};

/**
 * Whether the page's scripts run yet. A form's submit button waits for it: before, the browser would send the form by
 * itself and put what was typed into the address.
 */
export function useAwake(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
