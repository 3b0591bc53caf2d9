import { useEffect, useRef } from "react";

/** What lies above a sheet and takes the key first. */
const above = ".dlg, .palette, .popup:not([hidden])";

/** Escape leaves, wherever the focus is, unless something lies above. */
export function useEscape(leave: () => void): void {
  const latest = useRef(leave);
  useEffect(() => {
    latest.current = leave;
  });
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.key === "Escape" && !event.defaultPrevented && !document.querySelector(above))
        latest.current();
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, []);
}
