"use client";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { EmptyState } from "@withy/ui/empty-state";
import { ErrorSummary } from "@withy/ui/error-summary";
import { ChangesProvider, RecentChanges, useChanges } from "@withy/ui/recent-changes";
import { Skeleton } from "@withy/ui/skeleton";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { Section } from "./section";

function Dialogs({ prefix }: { prefix: string }) {
  const [open, setOpen] = useState<"centre" | "side" | null>(null);
  return (
    <div className="btns">
      <Button onClick={() => setOpen("centre")}>Open a dialog</Button>
      <Button onClick={() => setOpen("side")}>Open a side sheet</Button>
      <Dialog
        open={open !== null}
        onOpenChange={(next) => !next && setOpen(null)}
        place={open ?? "centre"}
        title="Move Thandiwe Marsh"
        lead="From Tuesday 1 December, 10:45, with Nia in Reed. She is told by text."
        actions={
          <Button kind="primary" onClick={() => setOpen(null)}>
            Move to Wednesday, 10:15
          </Button>
        }
      >
        <TextInput id={`${prefix}-at`} label="At" defaultValue="10:15" span="short" />
      </Dialog>
    </div>
  );
}

function Changes() {
  const { announce } = useChanges();
  return (
    <div>
      <Button
        onClick={() =>
          announce({ at: "10:44", said: "Thandiwe Marsh moved to Wednesday, 10:15", undo: async () => {} })
        }
      >
        Change something
      </Button>
      <h3 className="pt-3">Recent changes</h3>
      <RecentChanges />
    </div>
  );
}

/** What speaks to a person: alerts, errors, dialogs, changes, nothing yet, not yet. */
export function Messages({ prefix }: { prefix: string }) {
  const [attempt, setAttempt] = useState(0);
  const id = `${prefix}-birth`;
  const error = "Date of birth must include a year";
  return (
    <ChangesProvider>
      <Section title="Dialog, message, recent changes" note="Lifted things get a 2 px line">
        <div className="guide-two">
          <div>
            <Dialogs prefix={prefix} />
            <div className="pt-3">
              <AlertLine>
                <b>Hard of hearing.</b> Face her when you speak.
              </AlertLine>
              <AlertLine tone="danger">The time was taken while you typed. Choose another.</AlertLine>
              <AlertLine tone="ok">Free. Fills a gap exactly.</AlertLine>
            </div>
          </div>
          <Changes />
        </div>
      </Section>
      <Section title="Errors, emptiness, waiting" note="What, why, what next">
        <div className="guide-two">
          <div>
            <ErrorSummary errors={attempt > 0 ? [{ id, message: error }] : []} attempt={attempt} />
            <TextInput id={id} label="Date of birth" error={attempt > 0 ? error : undefined} span="mid" />
            <Button onClick={() => setAttempt(attempt + 1)}>Save the date</Button>
          </div>
          <div>
            <EmptyState title="No one is waiting for a time at Upper Wharf.">
              When a caller cannot have the time they want, put them here with their wishes.
            </EmptyState>
            <Skeleton lines={3} />
          </div>
        </div>
      </Section>
    </ChangesProvider>
  );
}
