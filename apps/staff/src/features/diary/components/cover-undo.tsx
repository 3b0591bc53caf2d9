"use client";
import { Button } from "@withy/ui/button";
import { useSecondsLeft } from "../hooks/use-seconds-left";

/** "9 minutes" while there are minutes, then seconds. */
const leftWords = (seconds: number): string =>
  seconds >= 120 ? `${Math.floor(seconds / 60)} minutes` : `${seconds} seconds`;

/** The whole act can be taken back for a while; says for how long still. */
export function CoverUndo({
  until,
  busy,
  onUndo,
}: {
  until: string | null;
  busy: boolean;
  onUndo: () => void;
}) {
  const left = useSecondsLeft(until);
  if (until === null || left === 0)
    return <p className="soft">The visits have moved. The time to undo it all has passed.</p>;
  return (
    <p className="coverundo">
      The visits have moved, and the time away stands in the diary.
      <Button size="small" busy={busy} onClick={onUndo}>
        Undo it all
      </Button>
      {/* Not read out each second: the words around it are what matters. */}
      {left !== null && (
        <span className="soft num" aria-live="off">
          {leftWords(left)} left
        </span>
      )}
    </p>
  );
}
