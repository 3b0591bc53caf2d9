"use client";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useActionState } from "react";
import { askReader, type ReaderState } from "@/server/letter-actions";

const unasked: ReaderState = { bornOn: "", problem: null, isRight: false, attempt: 0 };

/** First the date of birth, then the button that opens the letter with it. Both are plain forms. */
export function LetterReaderForm({ token }: { token: string }) {
  const [state, act, isBusy] = useActionState(askReader, unasked);
  if (state.isRight)
    return (
      <form key="open" method="post" action={`/link/${token}/letter/pdf`} target="_blank" rel="noopener">
        <input type="hidden" name="bornOn" value={state.bornOn} />
        <p role="status">The date of birth is right.</p>
        <p>
          <Button kind="primary" size="wide" type="submit" autoFocus>
            Open the letter
          </Button>
        </p>
      </form>
    );
  const problem = state.problem ?? undefined;
  return (
    <form key="ask" action={act} noValidate>
      {problem !== undefined && (
        <ErrorSummary
          title="The letter stays closed"
          errors={[{ id: "bornOn", message: problem }]}
          attempt={state.attempt}
        />
      )}
      <input type="hidden" name="token" value={token} />
      <TextInput
        id="bornOn"
        name="bornOn"
        label="The patient's date of birth"
        hint="Day, month and year, such as 27 3 1958"
        span="mid"
        defaultValue={state.bornOn}
        error={problem}
      />
      <Button kind="primary" size="wide" type="submit" busy={isBusy}>
        Go on to the letter
      </Button>
    </form>
  );
}
