import { prepareThumb } from "./prepare-thumb";

/** A trace at the size of a word, to recognise a file by. */
export function TraceThumb(props: {
  hz: readonly number[];
  maxDb: readonly (number | null)[];
  label: string;
  width?: number;
  height?: number;
}) {
  const { hz, maxDb, label, width = 120, height = 28 } = props;
  const drawn = prepareThumb(hz, maxDb, width, height);
  return (
    <svg
      role="img"
      aria-label={drawn ? label : `${label}: no levels`}
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="inline-block align-middle"
    >
      {drawn ? (
        <>
          <path d={drawn.water} fill="var(--water-2)" />
          <path
            d={drawn.edge}
            fill="none"
            stroke="var(--deep)"
            strokeWidth="1"
            strokeLinecap="round"
            strokeLinejoin="round"
          />
        </>
      ) : (
        <path
          d={`M2,${height / 2}H${width - 2}`}
          stroke="var(--ink-soft)"
          strokeWidth="1"
          strokeDasharray="3 3"
        />
      )}
    </svg>
  );
}
