import { ButtonLink } from "@/components/ui/button";
import type { CalibrationGap } from "@/lib/core/bench/calibration-gap";

interface GapNoteProps {
  gaps: readonly CalibrationGap[];
  /** Address of the editor with the newest calibrations filled in; null: this member may not. */
  href: string | null;
}

function words({ name, reason, newestOn }: CalibrationGap): string {
  if (reason === "newer") return `${name} was calibrated anew on ${newestOn}.`;
  return newestOn === null
    ? `The calibration that ${name} holds is no longer on record, and there is no other.`
    : `The calibration that ${name} holds is no longer on record; the newest is of ${newestOn}.`;
}

/** Says where the path in force lags behind the calibrations on record. */
export function GapNote({ gaps, href }: GapNoteProps) {
  if (gaps.length === 0) return null;
  return (
    <div className="mb-4 border border-l-4 border-rule border-l-shoal bg-sheet px-3 py-2">
      <p className="font-medium">The signal path in force does not hold the newest calibrations.</p>
      <ul className="list-disc pl-5">
        {gaps.map((gap) => (
          <li key={gap.place}>{words(gap)}</li>
        ))}
      </ul>
      {href ? (
        <ButtonLink href={href} className="my-2">
          Make a revision with them
        </ButtonLink>
      ) : null}
    </div>
  );
}
