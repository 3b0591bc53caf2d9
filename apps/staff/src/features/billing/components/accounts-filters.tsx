"use client";
import { type AgeBucket, ageBucketWords } from "@withy/billing/ageing";
import type { AgedDebtView, InvoiceKind } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { Button } from "@withy/ui/button";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import type { FilterAddress } from "../filter-address";

export interface SiteOption {
  id: string;
  name: string;
}

interface AccountsFiltersProps {
  filter: FilterAddress;
  change: (part: Partial<FilterAddress>) => void;
  aged: AgedDebtView;
  sites: readonly SiteOption[];
  kept: number;
}

const kindWords: Record<InvoiceKind, string> = {
  owed: "owed",
  overdue: "overdue",
  paid: "paid",
  refunded: "refunded",
  void: "void",
  all: "all issued",
};

/** Each part of the filter is a part of the address; the aged sums are buttons that keep their own rows. */
export function AccountsFilters({ filter, change, aged, sites, kept }: AccountsFiltersProps) {
  const kinds = Object.entries(kindWords).map(([value, label]) => ({ value, label }));
  const payers = [{ value: "patients", label: "patients themselves" }].concat(
    aged.payers.map((p) => ({ value: p.id, label: p.name })),
  );
  return (
    <section className="accfilters" aria-label="Filter">
      <AgeStrip aged={aged} chosen={filter.age} onChoose={(age) => change({ age, kind: "owed" })} />
      <div className="accfields">
        <Select
          id="filter-kind"
          label="State"
          options={kinds}
          value={filter.kind}
          onChange={(e) => change({ kind: e.target.value as InvoiceKind, age: undefined })}
        />
        <Select
          id="filter-payer"
          label="Payer"
          placeholder="anyone"
          options={payers}
          value={filter.payer ?? ""}
          onChange={(e) => change({ payer: e.target.value || undefined })}
        />
        {sites.length > 1 && (
          <Select
            id="filter-site"
            label="Site"
            placeholder="all"
            options={sites.map((s) => ({ value: s.id, label: s.name }))}
            value={filter.siteId ?? ""}
            onChange={(e) => change({ siteId: e.target.value || undefined })}
          />
        )}
        <FindField key={filter.find ?? ""} find={filter.find ?? ""} onFind={(find) => change({ find })} />
        <p className="small soft num acckept" aria-live="polite">
          {kept} kept by this filter
        </p>
      </div>
    </section>
  );
}

function FindField({ find, onFind }: { find: string; onFind: (find: string | undefined) => void }) {
  return (
    <search>
      <form
        className="accfind"
        onSubmit={(event) => {
          event.preventDefault();
          const text = String(new FormData(event.currentTarget).get("find") ?? "").trim();
          onFind(text === "" ? undefined : text);
        }}
      >
        <TextInput
          id="filter-find"
          name="find"
          type="search"
          label="Name or invoice number"
          defaultValue={find}
        />
        <Button type="submit">Find</Button>
      </form>
    </search>
  );
}

interface AgeStripProps {
  aged: AgedDebtView;
  chosen: AgeBucket | undefined;
  onChoose: (age: AgeBucket | undefined) => void;
}

function AgeStrip({ aged, chosen, onChoose }: AgeStripProps) {
  const oldest = [...aged.buckets].reverse();
  return (
    <fieldset className="agestrip">
      <legend className="small soft">Days past the due date</legend>
      <button type="button" aria-pressed={chosen === undefined} onClick={() => onChoose(undefined)}>
        <span className="soft">any</span>
        <b className="num">{formatMoney(aged.totalPence)}</b>
      </button>
      {oldest.map(({ bucket, pence, count }) => (
        <button
          type="button"
          key={bucket}
          aria-pressed={chosen === bucket}
          onClick={() => onChoose(chosen === bucket ? undefined : bucket)}
        >
          <span className="soft">
            {ageBucketWords[bucket]}
            <span className="vh">, {count} invoices</span>
          </span>
          <b className="num">{formatMoney(pence)}</b>
        </button>
      ))}
    </fieldset>
  );
}
