"use client";

import { Button } from "@/components/ui/button";

export default function ErrorPage({ reset }: { error: Error; reset: () => void }) {
  return (
    <main className="mx-auto max-w-xl px-6 py-24">
      <h1 className="text-3xl">This page could not be drawn</h1>
      <p className="mt-3 mb-6 text-ink-soft">
        The fault is on our side; nothing that was stored is lost.
      </p>
      <Button type="button" onClick={reset}>
        Try again
      </Button>
    </main>
  );
}
