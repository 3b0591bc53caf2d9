import { useEffect, useState } from "react";

/** The present instant, every ten seconds; starts as the server saw it, so that both paint the same page. */
export function useClock(fromServer: string): Date {
  const [now, setNow] = useState(() => new Date(fromServer));
  useEffect(() => {
    setNow(new Date());
    const timer = setInterval(() => setNow(new Date()), 10_000);
    return () => clearInterval(timer);
  }, []);
  return now;
}
