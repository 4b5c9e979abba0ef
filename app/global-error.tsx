"use client";

import "./globals.css";

/** Stands in for the whole page when the root layout itself cannot be drawn. */
export default function GlobalError({ reset }: { error: Error; reset: () => void }) {
  return (
    <html lang="en" data-theme="system">
      <body>
        <main className="mx-auto max-w-xl px-6 py-24">
          <title>Neap could not be drawn</title>
          <h1 className="text-3xl">Neap could not be drawn</h1>
          <p className="mt-3 mb-6 text-ink-soft">
            The fault is on our side; nothing that was stored is lost.
          </p>
          <button
            type="button"
            onClick={reset}
            className="min-h-10 cursor-pointer rounded-sm bg-deep px-4 font-medium text-paper"
          >
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
