import { useEffect } from "react";

const idleMs = 900;
const retryMs = 8000;

/** Calls `save` shortly after the last change, or later again where the last try failed, and warns before leaving. */
export function useAutosave(
  changed: { draft: unknown; isDirty: boolean },
  { isHeld, hasFailed, save }: { isHeld: boolean; hasFailed: boolean; save: () => void },
): void {
  const { draft, isDirty } = changed;
  useEffect(() => {
    if (!isDirty || isHeld) return;
    const timer = setTimeout(save, hasFailed ? retryMs : idleMs);
    return () => clearTimeout(timer);
  }, [draft, isDirty, isHeld, hasFailed, save]);

  useEffect(() => {
    if (!isDirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [isDirty]);
}
