"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { StatusNote } from "@/components/ui/status-note";
import type { Outcome } from "./outcome";

interface ArchivedListProps {
  label: string;
  items: { id: string; name: string; description: string; archivedOn: string }[];
  /** Left out where the role may only read. */
  restore?: (id: string) => Promise<Outcome>;
}

/** What was archived, and bringing it back. */
export function ArchivedList({ label, items, restore }: ArchivedListProps) {
  const [pendingId, setPendingId] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [done, setDone] = useState<string | null>(null);

  async function bringBack(id: string, name: string) {
    if (!restore) return;
    setPendingId(id);
    setRefusal(null);
    setDone(null);
    try {
      const outcome = await restore(id);
      if (outcome.ok) setDone(`${name} is back.`);
      else setRefusal(outcome.message);
    } catch {
      setRefusal("Neap could not be reached; nothing was changed. Check the connection.");
    } finally {
      setPendingId(null);
    }
  }

  return (
    <>
      <ErrorNote message={refusal} />
      <StatusNote message={done} />
      {items.length === 0 ? null : (
        <div
          className="overflow-x-auto border border-rule bg-sheet"
          tabIndex={0}
          role="region"
          aria-label={label}
        >
          <table className="w-full text-left">
            <thead className="text-sm text-ink-soft">
              <tr className="border-b border-rule">
                <th className="px-4 py-2 font-medium">Name</th>
                <th className="px-4 py-2 font-medium">Archived on</th>
                {restore ? <th className="px-4 py-2 font-medium">Restore</th> : null}
              </tr>
            </thead>
            <tbody>
              {items.map((item) => (
                <tr key={item.id} className="border-b border-rule last:border-0">
                  <td className="px-4 py-2">
                    {item.name}
                    <span className="block text-sm text-ink-soft">{item.description}</span>
                  </td>
                  <td className="px-4 py-2 font-mono whitespace-nowrap">{item.archivedOn}</td>
                  {restore ? (
                    <td className="px-4 py-2">
                      <Button
                        look="quiet"
                        aria-label={`Restore ${item.name}`}
                        disabled={pendingId !== null}
                        onClick={() => bringBack(item.id, item.name)}
                      >
                        Restore
                      </Button>
                    </td>
                  ) : null}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </>
  );
}
