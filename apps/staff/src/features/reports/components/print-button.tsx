"use client";
import { Button } from "@withy/ui/button";

export function PrintButton() {
  return (
    <Button size="small" onClick={() => window.print()}>
      Print
    </Button>
  );
}
