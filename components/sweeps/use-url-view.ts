"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { useMemo, useSyncExternalStore } from "react";

export interface UrlView {
  fromHz: number;
  toHz: number;
  scale: "log" | "linear";
}

const CHANGED = "neap-view";

function listen(onChange: () => void): () => void {
  window.addEventListener(CHANGED, onChange);
  window.addEventListener("popstate", onChange);
  return () => {
    window.removeEventListener(CHANGED, onChange);
    window.removeEventListener("popstate", onChange);
  };
}

/**
 * What is in view, kept in the address: it can be sent to somebody, and Back leads back. The
 * address is read at once, not through the router, so that a second key press starts from what
 * the first one left.
 */
export function useUrlView(extent: { fromHz: number; toHz: number }) {
  const given = useSearchParams().toString();
  const path = usePathname();
  const search = useSyncExternalStore(
    listen,
    () => window.location.search,
    () => `?${given}`,
  );
  const view = useMemo((): UrlView => {
    const params = new URLSearchParams(search);
    const from = Number(params.get("from") ?? extent.fromHz);
    const to = Number(params.get("to") ?? extent.toHz);
    const scale = params.get("scale") === "linear" ? "linear" : "log";
    const isView = Number.isFinite(from) && Number.isFinite(to) && to > from && from >= 0;
    return isView
      ? { fromHz: from, toHz: to, scale }
      : { fromHz: extent.fromHz, toHz: extent.toHz, scale };
  }, [search, extent.fromHz, extent.toHz]);

  function write(change: Record<string, string | null>) {
    const next = new URLSearchParams(window.location.search);
    for (const [name, value] of Object.entries(change)) {
      if (value === null) next.delete(name);
      else next.set(name, value);
    }
    const query = next.toString();
    window.history.replaceState(null, "", query ? `${path}?${query}` : path);
    window.dispatchEvent(new Event(CHANGED));
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
