import type { TransducerKind } from "@/lib/core/bench/signal-path";

/** What keeps people and inputs whole; the mains caution stands where a LISN is in the path. */
export function BenchCautions({ kinds }: { kinds: readonly TransducerKind[] }) {
  return (
    <ul className="max-w-[75ch] list-none space-y-3">
      {kinds.includes("lisn") ? (
        <li className="border-l-4 border-l-shoal bg-shoal-bed px-3 py-2 text-shoal">
          <strong>Mains:</strong> a LISN has a high earth-leakage current. Bond it to protective
          earth before mains is applied, use an isolating transformer where required, let only
          qualified people work on it, and follow local electrical codes.
        </li>
      ) : null}
      <li className="border-l-4 border-l-rule px-3 py-2">
        <strong>Instrument input:</strong> put a DC block, an attenuator or a limiter in place
        before the first connection. Check for overload by adding 10 dB of attenuation: the levels
        must not move.
      </li>
    </ul>
  );
}
