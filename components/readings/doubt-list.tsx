import type { Doubt } from "@/lib/core/reading/reading";

/** What weakens a reading, each with what to do about it. */
export function DoubtList({ doubts }: { doubts: Doubt[] }) {
  if (doubts.length === 0) return <p className="text-ink-soft">None that Neap can see.</p>;
  return (
    <ul className="space-y-2">
      {doubts.map((doubt) => (
        <li
          key={doubt.text}
          className="max-w-[75ch] border-l-4 border-shoal bg-shoal-bed px-3 py-2"
        >
          {doubt.text}
        </li>
      ))}
    </ul>
  );
}
