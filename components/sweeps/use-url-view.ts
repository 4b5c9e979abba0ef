"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { useMemo } from "react";

export interface UrlView {
  fromHz: number;
  toHz: number;
  scale: "log" | "linear";
}

/** What is in view, kept in the address: it can be sent to somebody, and Back leads back. */
export function useUrlView(extent: { fromHz: number; toHz: number }) {
  const params = useSearchParams();
  const path = usePathname();
  const view = useMemo((): UrlView => {
    const from = Number(params.get("from") ?? extent.fromHz);
    const to = Number(params.get("to") ?? extent.toHz);
    const scale = params.get("scale") === "linear" ? "linear" : "log";
    const isView = Number.isFinite(from) && Number.isFinite(to) && to > from && from >= 0;
    return isView
      ? { fromHz: from, toHz: to, scale }
      : { fromHz: extent.fromHz, toHz: extent.toHz, scale };
  }, [params, extent.fromHz, extent.toHz]);

  function write(change: Record<string, string | null>) {
    // The address as it is now: two changes in one moment must not undo each other.
    const next = new URLSearchParams(window.location.search);
    for (const [name, value] of Object.entries(change)) {
      if (value === null) next.delete(name);
      else next.set(name, value);
    }
    const query = next.toString();
    window.history.replaceState(null, "", query ? `${path}?${query}` : path);
  }

  return {
    view,
    setView: ({ fromHz, toHz }: { fromHz: number; toHz: number }) => {
      const all = fromHz <= extent.fromHz && toHz >= extent.toHz;
      write({
        from: all ? null : String(Math.round(fromHz)),
        to: all ? null : String(Math.round(toHz)),
      });
    },
    setScale: (scale: "log" | "linear") => write({ scale: scale === "log" ? null : scale }),
  };
}
