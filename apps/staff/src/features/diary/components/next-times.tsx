"use client";
import type { SlotTakenDetail } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { Button } from "@withy/ui/button";

type Free = SlotTakenDetail["nextFree"][number];

/** After a lost race: what is in the way, and the next free times to take instead with one press. */
export function NextTimes({ taken, onTake }: { taken: SlotTakenDetail; onTake: (free: Free) => void }) {
  const by = taken.takenBy;
  return (
    <div className="nexttimes">
      {by && (
        <p className="small soft">
          In the way: {by.patientName}, {by.startTime} to {by.endTime}, with {by.therapistName} in{" "}
          {by.roomName}.
        </p>
      )}
      {taken.nextFree.length > 0 && (
        <>
          <h3 id="next-times">The next free times with the same therapist</h3>
          <ul className="btns" aria-labelledby="next-times">
            {taken.nextFree.slice(0, 3).map((free) => (
              <li key={free.startsAt}>
                <Button size="small" onClick={() => onTake(free)}>
                  <span className="num">
                    {weekdayDate(free.day)}, {free.startTime}
                  </span>
                </Button>
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  );
}
