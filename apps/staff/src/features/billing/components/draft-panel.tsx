"use client";
import type { InvoiceView } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { invoicePdfAddress } from "../api-client";
import { useDiscardDraft, useEditDraft, useIssueInvoice } from "../hooks/use-draft-writes";
import type { InvoiceRights } from "../invoice-rights";
import { AddItem } from "./add-item";
import { DraftLines } from "./draft-lines";

/** Changes a draft and issues it. Each change is saved and added up at once, so the page beside it is what goes out. */
export function DraftPanel({ invoice, may }: { invoice: InvoiceView; may: InvoiceRights }) {
  const router = useRouter();
  const edit = useEditDraft();
  const issue = useIssueInvoice();
  const discard = useDiscardDraft();
  // Counts the saves: what was typed is dropped once it is saved, and kept while it is refused.
  const [saves, setSaves] = useState(0);
  const [isDirty, setDirty] = useState(false);
  const version = { invoiceId: invoice.id, version: invoice.version };
  const failed = edit.error ?? issue.error ?? discard.error;
  const isBusy = edit.isPending || issue.isPending || discard.isPending;
  const kept = invoice.lines.map(({ id, quantity, discountBasisPoints }) => ({
    lineId: id,
    quantity,
    discountBasisPoints,
  }));
  const save = (lines: Parameters<typeof edit.mutate>[0]["lines"]) => {
    const onSuccess = () => {
      setSaves((n) => n + 1);
      setDirty(false);
    };
    edit.mutate({ ...version, lines }, { onSuccess });
  };
  useShortcut("issue", () => issue.mutate(version), may.issue && !isBusy && !isDirty);
  return (
    <aside className="pay" aria-label="Draft">
      <p className="state">
        <b>Draft</b>
        <span className="soft small">no number yet; nothing is owed</span>
      </p>
      <ErrorSummary
        errors={failed ? problemItems(failed) : []}
        attempt={edit.submittedAt + issue.submittedAt}
      />
      {may.issue && (
        <Button
          kind="primary"
          size="wide"
          shortcut="I"
          busy={isBusy}
          disabled={isDirty}
          onClick={() => issue.mutate(version)}
        >
          Issue {formatMoney(invoice.totalPence)}
        </Button>
      )}
      <p className="hint">
        {isDirty
          ? "Save the lines first, so that what is issued is what you see."
          : "Once issued it gets the next number and cannot be changed."}
      </p>
      {may.draft && (
        <>
          <DraftLines
            key={`lines-${saves}`}
            today={invoice.today}
            lines={invoice.lines}
            busy={isBusy}
            onDirty={() => setDirty(true)}
            onChange={save}
          />
          <AddItem
            key={`item-${saves}`}
            invoiceId={invoice.id}
            busy={isBusy}
            onAdd={(item) => save([...kept, item])}
          />
        </>
      )}
      <p className="more">
        <a
          className="btn"
          data-kind="plain"
          href={invoicePdfAddress(invoice.id)}
          target="_blank"
          rel="noreferrer"
        >
          PDF of the draft
        </a>
        {may.draft && (
          <Button
            kind="plain"
            busy={isBusy}
            onClick={() => discard.mutate(version, { onSuccess: () => router.push("/billing/drafts") })}
          >
            Discard the draft
          </Button>
        )}
      </p>
    </aside>
  );
}
