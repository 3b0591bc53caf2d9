import { useEffect, useState } from "react";

/** Seconds until an instant, told anew every second; null before the page has woken, 0 once it has passed. */
export function useSecondsLeft(until: string | null): number | null {
  const [left, setLeft] = useState<number | null>(null);
  useEffect(() => {
    if (until === null) return setLeft(null);
    const tell = () => setLeft(Math.max(0, Math.ceil((Date.parse(until) - Date.now()) / 1000)));
    tell();
    const timer = setInterval(tell, 1000);
    return () => clearInterval(timer);
  }, [until]);
  return left;
}
