"use client";

import { Button } from "@/components/ui/button";

export function PrintButton() {
  return (
    <Button look="quiet" onClick={() => window.print()}>
      Print
    </Button>
  );
}
