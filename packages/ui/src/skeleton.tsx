import type { CSSProperties } from "react";

const widths = ["46%", "62%", "38%", "54%", "70%"];

/** Ruled lines while something loads. Shows itself only after 300 ms, so that a fast answer never flickers. */
export function Skeleton({ lines = 5, label = "Loading" }: { lines?: number; label?: string }) {
  return (
    <div className="skeleton" role="status">
      <em className="vh">{label}</em>
      {Array.from({ length: lines }, (_, i) => (
        <span key={i} style={{ "--w": widths[i % widths.length] } as CSSProperties} />
      ))}
    </div>
  );
}
