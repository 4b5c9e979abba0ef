import type { Readout } from "./prepare-readout";

function Item({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <span className="whitespace-nowrap">
      <span className="text-ink-soft">{name}</span> {children}
    </span>
  );
}

/** What the crosshair reads, in a fixed place, so that it never covers what it speaks of. */
export function CoastReadout(props: { readout: Readout | null; hint: string; rows: number }) {
  const { readout, hint, rows } = props;
  return (
    <div
      role="status"
      style={{ minHeight: `${rows * 1.5}rem` }}
      className="mb-1 flex flex-wrap content-start items-baseline gap-x-4 text-[0.8rem] leading-6"
    >
      {readout ? (
        <>
          <span className="font-mono font-semibold whitespace-nowrap">{readout.frequency}</span>
          {readout.traces.map((trace, i) => (
            <Item key={i} name={trace.name}>
              <span className="font-mono">{trace.level}</span>
            </Item>
          ))}
          {readout.limits.map((limit, i) => (
            <Item key={i} name={`${limit.name} limit`}>
              <span className="font-mono">{limit.limit}</span>
              <span className="text-ink-soft">, margin </span>
              <span className={`font-mono font-semibold ${limit.over ? "text-aground" : ""}`}>
                {limit.margin}
              </span>
              {limit.over ? <span className="text-aground"> over</span> : null}
              {limit.caveat ? <span className="text-ink-soft"> ({limit.caveat})</span> : null}
            </Item>
          ))}
        </>
      ) : (
        <span className="text-ink-soft">{hint}</span>
      )}
    </div>
  );
}
