"use client";
import { vatWords } from "@withy/billing/vat";
import { formatMoney } from "@withy/core/money";
import { Button } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { useAwake } from "@/components/use-awake";
import { useProducts } from "../hooks/use-products";

interface AddItemProps {
  invoiceId: string;
  busy: boolean;
  onAdd: (item: { productId: string; quantity: number; discountBasisPoints: number }) => void;
}

/** Puts goods on the draft at today's price. */
export function AddItem({ invoiceId, busy, onAdd }: AddItemProps) {
  const products = useProducts(invoiceId);
  const isAwake = useAwake();
  const [productId, setProductId] = useState("");
  const [quantity, setQuantity] = useState("1");
  const [wrong, setWrong] = useState<{ product?: string; quantity?: string }>({});
  const list = products.data ?? [];
  if (products.isSuccess && list.length === 0) return null;
  const add = () => {
    const count = Number(quantity);
    const isCount = Number.isInteger(count) && count > 0 && count < 100;
    const found = {
      ...(productId === "" ? { product: "Choose an item." } : {}),
      ...(isCount ? {} : { quantity: "Enter a whole number from 1 to 99." }),
    };
    setWrong(found);
    if (Object.keys(found).length === 0) onAdd({ productId, quantity: count, discountBasisPoints: 0 });
  };
  return (
    <form
      className="additem"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        add();
      }}
    >
      <SectionHead title="Add an item" level={3} />
      <Select
        id="item-product"
        label="Item"
        placeholder={products.isPending ? "Looking" : "Choose an item"}
        options={list.map((p) => ({
          value: p.id,
          label: `${p.name}, ${formatMoney(p.pricePence)} ${p.vatTreatment === "standard" ? "plus " : ""}${vatWords[p.vatTreatment]}`,
        }))}
        value={productId}
        onChange={(event) => setProductId(event.target.value)}
        error={wrong.product}
      />
      <div className="linefields">
        <TextInput
          id="item-quantity"
          label="Quantity"
          inputMode="numeric"
          span="short"
          value={quantity}
          onChange={(event) => setQuantity(event.target.value)}
          error={wrong.quantity}
        />
        <Button type="submit" disabled={!isAwake} busy={busy}>
          Add it
        </Button>
      </div>
    </form>
  );
}
