import Link from "next/link";
import { DueMark } from "@/components/equipment/due-mark";
import { keepUnits } from "@/components/ui/keep-units";
import { dueState } from "@/lib/core/bench/due-state";
import type { SweepInstrument } from "@/lib/core/bench/equipment";

interface InstrumentStateProps {
  instrument: SweepInstrument | null;
  /** What the bench says of it in words. */
  words: string;
  /** ISO date. */
  today: string;
}

/** The bench's instrument with the state of its calibration; without equipment only its words. */
export function InstrumentState({ instrument, words, today }: InstrumentStateProps) {
  if (!instrument) {
    if (words === "") return <span className="text-ink-soft">not stated</span>;
    return (
      <>
        {keepUnits(words)}
        <span className="block text-sm text-ink-soft">no equipment named</span>
      </>
    );
  }
  const { calibratedOn, dueOn } = instrument;
  return (
    <>
      <Link href={`/benches/equipment/${instrument.equipmentId}`} className="text-deep underline">
        {keepUnits(instrument.name)}
      </Link>
      {words ? <span className="block text-sm text-ink-soft">{keepUnits(words)}</span> : null}
      <span className="block text-sm">
        <DueMark state={calibratedOn === null ? "uncalibrated" : dueState(dueOn, today)} />
        {dueOn ? (
          <>
            , due <span className="font-mono">{dueOn}</span>
          </>
        ) : null}
      </span>
    </>
  );
}
