"use client";
import { Button } from "@withy/ui/button";
import { PlainPage } from "@/components/plain-page";

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <PlainPage title="Something went wrong on our side">
      <p>
        Nothing was changed. Try again; if it stays, tell whoever looks after Withy this number:{" "}
        {error.digest ?? "none"}.
      </p>
      <p>
        <Button kind="primary" onClick={reset}>
          Try again
        </Button>
      </p>
    </PlainPage>
  );
}
