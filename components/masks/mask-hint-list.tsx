import type { Mask } from "@/lib/core/mask/mask";
import { maskHints } from "@/lib/core/mask/mask-hints";

/** What is allowed in a mask and yet worth a second look; nothing for a mask that has none. */
export function MaskHintList({ mask }: { mask: Mask }) {
  const hints = maskHints(mask);
  if (hints.length === 0) return null;
  return (
    <section aria-label="Worth a second look" className="mt-4 border-l-4 border-l-rule pl-3">
      <p className="text-sm font-medium">Worth a second look; none of it keeps the mask back</p>
      <ul className="mt-1 space-y-1 text-sm text-ink-soft">
        {hints.map(({ path, text }) => (
          <li key={`${path} ${text}`}>{text}</li>
        ))}
      </ul>
    </section>
  );
}
