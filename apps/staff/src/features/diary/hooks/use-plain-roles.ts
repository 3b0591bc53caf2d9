import { type RefObject, useEffect } from "react";

const tableRoles = '[role="row"], [role="rowgroup"], [role="columnheader"], [role="cell"], [role="table"]';

/**
 * The calendar marks parts of its layout as rows and headers of a table that is not there, which breaks reading by
 * table. Its visits are buttons with full names; the loose table roles are taken off, also from what it draws later.
 */
export function usePlainRoles(box: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const root = box.current;
    if (!root) return;
    const strip = () => {
      for (const element of root.querySelectorAll(tableRoles)) element.removeAttribute("role");
      for (const element of root.querySelectorAll("[aria-sort]")) element.removeAttribute("aria-sort");
    };
    strip();
    const observer = new MutationObserver(strip);
    observer.observe(root, {
      childList: true,
      subtree: true,
      attributes: true,
      attributeFilter: ["role", "aria-sort"],
    });
    return () => observer.disconnect();
  }, [box]);
}
