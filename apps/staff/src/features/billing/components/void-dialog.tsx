"use client";
import type { InvoiceView } from "@withy/contracts/billing";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useVoidInvoice } from "../hooks/use-draft-writes";

/** Makes an unpaid invoice void, with its reason. The number stays used; the visits can be invoiced again. */
export function VoidDialog({ invoice, onClose }: { invoice: InvoiceView; onClose: () => void }) {
  const make = useVoidInvoice();
  const [reason, setReason] = useState("");
  const errors = make.error ? problemItems(make.error, (field) => `void-${field}`) : [];
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Make ${invoice.reference} void`}
      lead="Nothing is to be paid on it then. Its number stays used, and its visits wait to be invoiced again."
      closeLabel="Keep it"
      actions={
        <Button kind="stop" type="submit" form="void-form" busy={make.isPending}>
          Make it void
        </Button>
      }
    >
      <form
        id="void-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          make.mutate({ invoiceId: invoice.id, version: invoice.version, reason }, { onSuccess: onClose });
        }}
      >
        <ErrorSummary errors={errors} attempt={make.submittedAt} />
        <TextInput
          id="void-reason"
          label="Why"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={errors.find((e) => e.id === "void-reason")?.message}
        />
      </form>
    </Dialog>
  );
}
