import Link from "next/link";
import type { EquipmentState } from "./equipment-words";
import { dueAnswer } from "./equipment-words";

/** The way to the equipment with how much of it is overdue, in one line. */
export function OverdueNote({ equipment }: { equipment: readonly { state: EquipmentState }[] }) {
  const { number, words, rest } = dueAnswer(equipment);
  const isDue = equipment.some(({ state }) => state === "overdue");
  return (
    <p className="mb-6">
      <Link href="/benches/equipment" className="text-deep underline">
        Equipment
      </Link>
      :{" "}
      {equipment.length === 0 ? (
        <span className="text-ink-soft">none on record yet.</span>
      ) : (
        <>
          <span className={isDue ? "bg-shoal-bed px-1 text-shoal" : ""}>
            <span className="font-mono">{number}</span> {words}
          </span>{" "}
          <span className="text-ink-soft">{rest}</span>
        </>
      )}
    </p>
  );
}
