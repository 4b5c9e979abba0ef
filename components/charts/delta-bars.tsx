import { formatDelta } from "@/lib/core/units/format";
import { prepareBars, type DeltaItem } from "./prepare-bars";

/** What each step bought: to the right of zero the margin grew, to the left it shrank. */
export function DeltaBars({ items }: { items: readonly DeltaItem[] }) {
  const { zeroPercent, bars } = prepareBars(items);
  return (
    <ul className="grid grid-cols-[minmax(5rem,auto)_1fr_max-content] items-center gap-x-3 text-[0.87rem]">
      {bars.map(({ label, changeDb, leftPercent, widthPercent }, i) => (
        <li key={i} className="contents">
          <span className="py-1">{label}</span>
          <span aria-hidden="true" className="relative block h-full min-h-7 min-w-16">
            <span
              className="absolute inset-y-0 w-px bg-ink-soft"
              style={{ left: `${zeroPercent}%` }}
            />
            {changeDb === null ? (
              <span
                className="absolute inset-y-[35%] w-6 border border-dashed border-ink-soft"
                style={
                  zeroPercent > 50
                    ? { right: `${100 - zeroPercent}%` }
                    : { left: `${zeroPercent}%` }
                }
              />
            ) : (
              <span
                className={`absolute inset-y-[22%] ${changeDb < 0 ? "bg-shoal" : "bg-deep"}`}
                style={{ left: `${leftPercent}%`, width: `${widthPercent}%` }}
              />
            )}
          </span>
          <span className="text-right whitespace-nowrap">
            {changeDb === null ? (
              <span className="text-ink-soft">not comparable</span>
            ) : (
              <span className="font-mono">{formatDelta(changeDb)}</span>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
