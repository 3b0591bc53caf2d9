import type { ReactNode } from "react";

/** Nothing here yet: what it is, why it is empty, what to do next. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="empty">
      <p className="serif">{title}</p>
      {children && <div className="soft">{children}</div>}
      {action}
    </div>
  );
}
