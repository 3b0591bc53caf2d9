import { useEffect, useState } from "react";

/** The minute of the site's day, moving on by itself from the server's answer; null on another day. */
export function useNowMinute(fromServer: number | null): number | null {
  const [minute, setMinute] = useState(fromServer);
  useEffect(() => {
    setMinute(fromServer);
    if (fromServer === null) return;
    const started = Date.now();
    const timer = setInterval(
      () => setMinute(fromServer + Math.floor((Date.now() - started) / 60_000)),
      10_000,
    );
    return () => clearInterval(timer);
  }, [fromServer]);
  return minute;
}
