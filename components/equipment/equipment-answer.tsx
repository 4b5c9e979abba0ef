import { dueAnswer, type EquipmentState } from "./equipment-words";

/** "What is due?": how many are overdue, before any table. */
export function EquipmentAnswer({
  equipment,
}: {
  equipment: readonly { state: EquipmentState }[];
}) {
  if (equipment.length === 0) return null;
  const { number, words, rest } = dueAnswer(equipment);
  return (
    <div className="mb-6">
      <p>
        <span className="font-mono text-4xl">{number}</span>{" "}
        <span className="text-lg">{words}</span>
      </p>
      {rest ? <p className="mt-1 text-shoal">{rest}</p> : null}
    </div>
  );
}
