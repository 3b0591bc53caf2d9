import { refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import type { EpisodeRow } from "../episode-records";

/** A programme belongs to treatment that goes on; after discharge it is history. */
export function requireOpenEpisode(episode: EpisodeRow): void {
  const message = "This episode of care has ended. Open it again to change its exercises.";
  refuseIf(episode.state === "open" ? null : refusal("episode-ended", message));
}
