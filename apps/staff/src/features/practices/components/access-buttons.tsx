"use client";
import type { StaffRow } from "@withy/contracts/practices";
import { Button } from "@withy/ui/button";
import { useChanges } from "@withy/ui/recent-changes";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useDeactivate, useInviteAgain, useReactivate } from "../hooks/use-staff";
import { momentWords } from "../moment-words";

const EndAccessDialog = dynamic(() => import("./end-access-dialog").then((m) => m.EndAccessDialog), {
  ssr: false,
});

interface Props {
  member: StaffRow;
  isSelf: boolean;
  zone: string;
  onProblem: (problem: string | null) => void;
}

/** Ends a colleague's access, gives it back, or sends the invitation once more. */
export function AccessButtons({ member, isSelf, zone, onProblem }: Props) {
  const { announce } = useChanges();
  const [isAsking, setIsAsking] = useState(false);
  const [end, giveBack, again] = [useDeactivate(), useReactivate(), useInviteAgain()];
  const tell = (said: string) => {
    onProblem(null);
    setIsAsking(false);
    announce({ at: momentWords(new Date().toISOString(), zone).slice(-5), said });
  };
  const onError = (error: Error) => {
    setIsAsking(false);
    onProblem(error.message);
  };
  const endAccess = () =>
    end.mutate(member.id, {
      onSuccess: ({ upcomingVisits }) =>
        tell(
          upcomingVisits === 0
            ? `You ended the access of ${member.name}`
            : `You ended the access of ${member.name}; ${upcomingVisits} booked visits need cover`,
        ),
      onError,
    });
  if (!member.isActive)
    return (
      <Button
        kind="plain"
        size="small"
        busy={giveBack.isPending}
        onClick={() =>
          giveBack.mutate(member.id, { onSuccess: () => tell(`${member.name} can sign in again`), onError })
        }
      >
        Give access again<span className="vh"> to {member.name}</span>
      </Button>
    );
  return (
    <>
      {!member.hasJoined && (
        <Button
          kind="plain"
          size="small"
          busy={again.isPending}
          onClick={() =>
            again.mutate(member.id, { onSuccess: () => tell(`You invited ${member.name} again`), onError })
          }
        >
          Send again<span className="vh"> to {member.name}</span>
        </Button>
      )}
      {!isSelf && (
        <Button kind="plain" size="small" onClick={() => setIsAsking(true)}>
          End access<span className="vh"> of {member.name}</span>
        </Button>
      )}
      {isAsking && (
        <EndAccessDialog
          name={member.name}
          isEnding={end.isPending}
          onEnd={endAccess}
          onClose={() => setIsAsking(false)}
        />
      )}
    </>
  );
}
