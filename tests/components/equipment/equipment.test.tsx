import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { CalibrationHistory } from "@/components/equipment/calibration-history";
import { filterEquipment } from "@/components/equipment/equipment-filter";
import { dueAnswer } from "@/components/equipment/equipment-words";

describe("what is due", () => {
  test("counts what is overdue, and says what falls due and what nobody stated", () => {
    const states = ["overdue", "due-soon", "due-soon", "undated", "in-date"] as const;
    expect(dueAnswer(states.map((state) => ({ state })))).toEqual({
      number: "1",
      words: "calibration is overdue.",
      rest: "2 more fall due within 30 days; of 1 nobody stated when it is due.",
    });
    expect(dueAnswer([{ state: "in-date" }])).toEqual({
      number: "0",
      words: "calibrations are overdue.",
      rest: "",
    });
  });

  test("each view shows its own, and archived ones stand in theirs alone", () => {
    const piece = (kind: string, state: string, archived = false) => ({ kind, state, archived });
    const all = [
      piece("instrument", "overdue"),
      piece("cable", "due-soon"),
      piece("cable", "in-date"),
      piece("antenna", "overdue", true),
    ];
    const counts = (["all", "due", "instruments", "transducers", "archived"] as const).map(
      (view) => filterEquipment(all, view).length,
    );
    expect(counts).toEqual([3, 2, 1, 2, 1]);
  });
});

test("the history tells which calibration is in force and which was withdrawn", () => {
  const row = {
    dueOn: "2026-11-30",
    laboratory: "Harbour calibration",
    certificateNumber: "",
    fileName: null,
    factors: null,
    recordedBy: "Reed",
    recordedAt: new Date("2026-11-01T10:00:00Z"),
    withdrawnAt: null,
  };
  const html = renderToStaticMarkup(
    <CalibrationHistory
      equipmentId="e"
      today="2026-12-01"
      withdraw={null}
      calibrations={[
        { ...row, id: "1", calibratedOn: "2026-10-01", withdrawnAt: new Date("2026-11-02") },
        { ...row, id: "2", calibratedOn: "2025-11-30", fileName: "c.pdf" },
        { ...row, id: "3", calibratedOn: "2024-11-30" },
      ]}
    />,
  );
  expect(html.match(/in force|earlier|withdrawn 2026-11-02/g)).toEqual([
    "withdrawn 2026-11-02",
    "in force",
    "earlier",
  ]);
  expect(html.match(/overdue/g)).toHaveLength(1);
  expect(html).toContain("/benches/equipment/e/certificates/2");
});
