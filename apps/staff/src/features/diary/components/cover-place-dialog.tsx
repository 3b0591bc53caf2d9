"use client";
import { useQuery } from "@tanstack/react-query";
import type { CoverMoveView, CoverPlaceView, CoverPlanView } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { Skeleton } from "@withy/ui/skeleton";
import { problemItems } from "@/api/form-problems";
import { fetchCoverPlaces } from "../cover-api";
import { counted, placeWords } from "../cover-words";
import type { useCoverPlan } from "../hooks/use-cover-plan";
import { diaryKeys } from "../query-keys";

interface CoverPlaceDialogProps {
  plan: CoverPlanView;
  move: CoverMoveView;
  decide: ReturnType<typeof useCoverPlan>["decide"];
  onClose: () => void;
}

/** Other places for one visit, the least change first. */
export function CoverPlaceDialog({ plan, move, decide, onClose }: CoverPlaceDialogProps) {
  const places = useQuery({
    queryKey: diaryKeys.coverPlaces(plan.id, plan.version, move.id),
    queryFn: ({ signal }) => fetchCoverPlaces(plan.id, move.id, signal),
  });
  const take = ({ startsAt, therapist, site, room }: CoverPlaceView) =>
    decide.mutate(
      {
        ...{ coverPlanId: plan.id, coverMoveId: move.id, version: plan.version, decision: "change" },
        place: { startsAt, therapistId: therapist.id, siteId: site.id, roomId: room.id },
      },
      { onSuccess: onClose },
    );
  const failure = decide.error ?? places.error;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      size="wide"
      title={`Another place for ${move.patient.name}`}
      lead={`Was ${placeWords(move.before, move.before.site.id)}.`}
    >
      {failure && (
        <AlertLine tone="danger" live>
          {problemItems(failure)[0]?.message}
        </AlertLine>
      )}
      {places.isPending && <Skeleton lines={6} label="Looking for places" />}
      {places.data?.length === 0 && (
        <p>No other place within a week. Ring the patient, or find a later time by hand.</p>
      )}
      <ul className="coverplaces">
        {places.data?.map((place) => (
          <li key={`${place.startsAt} ${place.therapist.id}`}>
            <span className="num">{placeWords(place, move.before.site.id)}</span>
            <span className="soft small">{[...place.reasons, counted(place.cost, "point")].join(", ")}</span>
            <Button
              size="small"
              busy={decide.isPending}
              aria-label={`Take ${placeWords(place, move.before.site.id)}`}
              onClick={() => take(place)}
            >
              Take it
            </Button>
          </li>
        ))}
      </ul>
    </Dialog>
  );
}
