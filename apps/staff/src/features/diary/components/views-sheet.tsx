"use client";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { deskKeys, fetchViews, removeView, saveView } from "../desk-client";

export interface ViewsSheetProps {
  /** The view that is shown now, without its day. */
  address: string;
  day: string | undefined;
  onClose: () => void;
}

const withDay = (address: string, day: string | undefined): string =>
  day === undefined ? address : `${address}${address.includes("?") ? "&" : "?"}day=${day}`;

/** Views of the diary that one named, and the present one to name. */
export function ViewsSheet({ address, day, onClose }: ViewsSheetProps) {
  const client = useQueryClient();
  const [name, setName] = useState("");
  const views = useQuery({ queryKey: deskKeys.views, queryFn: ({ signal }) => fetchViews(signal) });
  const onSettled = () => client.invalidateQueries({ queryKey: deskKeys.views });
  const save = useMutation({ mutationFn: saveView, onSuccess: () => setName(""), onSettled });
  const remove = useMutation({ mutationFn: removeView, onSettled });
  const failure = save.error ?? remove.error;
  const errors = failure ? problemItems(failure, () => "view-name") : [];
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Views" place="side" closeLabel="Close">
      <ErrorSummary errors={errors} title="The view is not kept yet" attempt={String(save.submittedAt)} />
      {views.data?.length === 0 && <p className="soft">No view has a name yet.</p>}
      <ul className="savedviews">
        {views.data?.map((view) => (
          <li key={view.id}>
            <Link href={withDay(view.address, day)} onClick={onClose}>
              {view.name}
            </Link>
            <Button kind="plain" size="small" busy={remove.isPending} onClick={() => remove.mutate(view.id)}>
              Remove<span className="vh">: {view.name}</span>
            </Button>
          </li>
        ))}
      </ul>
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          save.mutate({ name, address });
        }}
      >
        <TextInput
          id="view-name"
          label="Name of this view"
          hint="Sites and columns as they are shown now; the day is left open"
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={errors[0]?.message}
        />
        <Button type="submit" busy={save.isPending}>
          Keep this view
        </Button>
      </form>
    </Dialog>
  );
}
