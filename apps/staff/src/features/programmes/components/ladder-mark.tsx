/** A ladder with the present rung thick; the easiest form is the lowest rung. */
export function LadderMark({ rung, rungs }: { rung: number; rungs: number }) {
  const gap = rungs > 1 ? 26 / (rungs - 1) : 0;
  return (
    <svg
      className="ladder-mark"
      viewBox="0 0 20 38"
      width="18"
      height="34"
      role="img"
      aria-label={`rung ${rung} of ${rungs}`}
    >
      <path d="M4 2V37M16 2V37" strokeWidth="1.3" />
      {Array.from({ length: rungs }, (_, i) => (
        <path
          key={i}
          d={`M4 ${32 - i * gap}H16`}
          strokeWidth={i + 1 === rung ? 3.6 : 1.3}
          opacity={i + 1 === rung ? 1 : 0.65}
        />
      ))}
    </svg>
  );
}
