import { useEffect, useRef } from "react";
import { holdTime, releaseHold } from "../desk-client";
import { startsAtText, type WantedTime } from "../wanted-time";

const restMs = 300;
const renewMs = 60_000;

/**
 * Shows other desks that this time is being booked, for as long as the form is open and someone types in it. Whether it
 * works or not changes nothing here: who books first has the time.
 * @param typed everything in the form as one text; a change is a sign of the person
 */
export function useHoldTime(wanted: WantedTime, durationMinutes: number | undefined, typed: string): void {
  const { siteId, therapistId } = wanted;
  const startsAt = startsAtText(wanted);
  const renew = useRef<() => void>(() => {});
  useEffect(() => {
    if (!siteId || !therapistId || !startsAt) return;
    let saidAt = 0;
    const say = () => {
      saidAt = Date.now();
      const length = durationMinutes === undefined ? {} : { durationMinutes };
      holdTime({ siteId, therapistId, startsAt, ...length }).catch(() => {});
    };
    const timer = setTimeout(say, restMs);
    renew.current = () => saidAt > 0 && Date.now() - saidAt > renewMs && say();
    return () => {
      clearTimeout(timer);
      renew.current = () => {};
    };
  }, [siteId, therapistId, startsAt, durationMinutes]);
  useEffect(() => {
    if (typed !== "") renew.current();
  }, [typed]);
  useEffect(
    () => () => {
      releaseHold().catch(() => {});
    },
    [],
  );
}
