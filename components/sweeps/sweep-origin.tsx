import Link from "next/link";
import { Facts } from "@/components/ui/facts";
import { Section } from "@/components/ui/section";
import type { SignalPath } from "@/lib/core/bench/signal-path";

interface SweepOriginProps {
  sweep: {
    benchId: string;
    benchName: string;
    pathRevision: number;
    path: SignalPath;
    corrected: boolean;
    importedBy: string;
    importedAt: Date;
    fileName: string;
    sizeBytes: number;
    sha256: string;
    notes: string;
  };
}

/** Where a sweep comes from: bench, signal path, file. */
export function SweepOrigin({ sweep }: SweepOriginProps) {
  const path = sweep.path.transducers.map((transducer) => transducer.name).join(", ");
  return (
    <Section title="Origin">
      <Facts
        items={[
          {
            label: "Bench",
            value: (
              <Link href={`/benches/${sweep.benchId}`} className="text-deep underline">
                {sweep.benchName}
              </Link>
            ),
          },
          {
            label: `Signal path, revision ${sweep.pathRevision}`,
            value: sweep.corrected
              ? "corrected in the instrument, passed through unchanged"
              : path || "nothing between field and instrument",
          },
          {
            label: "Imported",
            value: `${sweep.importedAt.toISOString().slice(0, 10)} by ${sweep.importedBy}`,
          },
          { label: "File", value: `${sweep.fileName}, ${sweep.sizeBytes} bytes` },
          { label: "Notes", value: sweep.notes || null },
        ]}
      />
      <p className="mt-3 text-sm text-ink-soft">
        SHA-256 of the file <span className="font-mono break-all">{sweep.sha256}</span>
      </p>
    </Section>
  );
}
