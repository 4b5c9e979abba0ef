import type { SuspectState } from "@/lib/core/reading/suspect-state";

const LOOKS: Record<SuspectState, string> = {
  open: "border-shoal text-shoal",
  explained: "border-ink-soft text-ink-soft",
  treated: "border-deep text-deep",
  accepted: "border-ink-soft text-ink",
};

/** What has become of a followed suspect, in a word. */
export function StateTag({ state }: { state: SuspectState }) {
  return (
    <span
      className={`inline-block rounded-sm border px-1.5 text-sm whitespace-nowrap ${LOOKS[state]}`}
    >
      {state}
    </span>
  );
}
