"use client";
import type { ApiKeyRow } from "@withy/contracts/practices";
import { plainDateWords } from "@withy/core/date-words";
import { Button, Buttons } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { ErrorSummary } from "@withy/ui/error-summary";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { useMakeApiKey, useRevokeApiKey } from "../hooks/use-api-keys";
import { momentWords } from "../moment-words";
import { SecretOnce } from "./secret-once";

interface Props {
  first: readonly ApiKeyRow[];
  zone: string;
}

/** The keys with which other programs read the diary by FHIR. */
export function ApiKeys({ first, zone }: Props) {
  const [keys, setKeys] = useState(first);
  const [secret, setSecret] = useState<string | null>(null);
  const make = useMakeApiKey();
  const revoke = useRevokeApiKey();
  const isAwake = useAwake();
  const { register, handleSubmit, reset } = useForm({ defaultValues: { name: "" } });
  const save = handleSubmit((typed) =>
    make.mutate(typed, {
      onSuccess: (made) => {
        setKeys(made.keys);
        setSecret(made.secret);
        reset({ name: "" });
      },
    }),
  );
  const end = (id: string) => revoke.mutate(id, { onSuccess: (left) => setKeys(left) });
  return (
    <section aria-labelledby="keys-title">
      <SectionHead id="keys-title" title="Keys for other programs" aside="read the diary at /api/fhir/r4" />
      {revoke.error && (
        <p className="danger" role="alert">
          {revoke.error.message}
        </p>
      )}
      <DataTable
        caption="Keys"
        columns={keyColumns(zone, revoke.isPending || !isAwake, end)}
        rows={keys}
        rowId={(row) => row.id}
        empty="No other program can read the diary."
      />
      <form noValidate className="narrowform" onSubmit={save}>
        {make.error && (
          <ErrorSummary
            title="The key is not made yet"
            errors={problemItems(make.error)}
            attempt={make.submittedAt}
          />
        )}
        {secret !== null && (
          <SecretOnce
            id="newKey"
            label="The new key"
            hint="Shown only now. Give it to that program alone: with it, it reads visits with initials, and free and taken time."
            value={secret}
          />
        )}
        <TextInput
          id="name"
          label="What the key is for"
          hint="Such as the name of the program"
          error={fieldProblem(make.error, "name")}
          {...register("name")}
        />
        <Buttons>
          <Button type="submit" disabled={!isAwake} busy={make.isPending}>
            Make a key
          </Button>
        </Buttons>
      </form>
    </section>
  );
}

function keyColumns(
  zone: string,
  isBusy: boolean,
  end: (id: string) => void,
): readonly DataColumn<ApiKeyRow>[] {
  return [
    { id: "name", header: "For", rowHeader: true, cell: (row) => row.name },
    {
      id: "made",
      header: "Made",
      cell: (row) => `${momentWords(row.createdAt, zone)} by ${row.createdByName}`,
    },
    {
      id: "used",
      header: "Last used",
      cell: (row) => (row.lastUsedOn === null ? "Never" : plainDateWords(row.lastUsedOn)),
    },
    {
      id: "end",
      header: "End",
      cell: (row) =>
        row.revokedAt === null ? (
          <Button kind="plain" size="small" disabled={isBusy} onClick={() => end(row.id)}>
            End<span className="vh"> the key for {row.name}</span>
          </Button>
        ) : (
          `Ended ${momentWords(row.revokedAt, zone)}`
        ),
    },
  ];
}
