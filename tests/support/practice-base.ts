import type { fixedClock } from "@withy/core/clock";
import type { Database } from "@withy/db/client";

/** What every builder needs. A whole practice fits. */
export interface PracticeBase {
  readonly practiceId: string;
  readonly db: Database;
  readonly clock: ReturnType<typeof fixedClock>;
  readonly zone: string;
}
