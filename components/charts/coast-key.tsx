import type { PreparedTrace } from "./prepare-coast";

function Swatch({ trace }: { trace: PreparedTrace }) {
  const { role, dash } = trace;
  return (
    <svg width="26" height="12" aria-hidden="true" className="inline-block align-[-0.1em]">
      {role === "main" ? <path d="M1,5L8,3L17,6L25,3V12H1Z" fill="var(--water-1)" /> : null}
      <path
        d="M1,5L8,3L17,6L25,3"
        fill="none"
        stroke={
          role === "main" ? "var(--deep)" : role === "outline" ? "var(--ink)" : "var(--ink-soft)"
        }
        strokeWidth="1.25"
        strokeDasharray={role === "ambient" ? "1 2" : dash}
      />
    </svg>
  );
}

/** Which water is whose. Mask lines need no key: their names stand on them. */
export function CoastKey({ traces }: { traces: readonly PreparedTrace[] }) {
  return (
    <ul className="flex min-w-0 flex-wrap gap-x-4 text-[0.8rem] leading-6">
      {traces.map((trace) => (
        <li key={trace.id}>
          <Swatch trace={trace} /> {trace.name}
        </li>
      ))}
    </ul>
  );
}
