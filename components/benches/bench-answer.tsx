import { calibrationAnswer } from "./calibration";

interface BenchAnswerProps {
  benches: Parameters<typeof calibrationAnswer>[0];
}

/** "Can I trust this arrangement?" in one number and words, before any table. */
export function BenchAnswer({ benches }: BenchAnswerProps) {
  if (benches.length === 0) return null;
  const { number, words, rest } = calibrationAnswer(benches);
  return (
    <div className="mb-6">
      <p>
        <span className="font-mono text-4xl [word-spacing:-0.3em] whitespace-nowrap">{number}</span>{" "}
        <span className="text-lg">{words}</span>
      </p>
      {rest ? <p className="mt-1 text-shoal">{rest}</p> : null}
    </div>
  );
}
