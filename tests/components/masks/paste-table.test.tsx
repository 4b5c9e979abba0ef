import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test, vi } from "vitest";
import { ConfirmMaskForm } from "@/components/masks/confirm-mask-form";
import { emptyLine } from "@/components/masks/mask-draft";
import { MaskHintList } from "@/components/masks/mask-hint-list";
import { PasteTable } from "@/components/masks/paste-table";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { MASK } from "../../commands/mask/arrange";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }) }));

const nothing = () => undefined;
const TABLE = "start\tstop\tPK (dBµV/m)\tAV (dBµV/m)\n0.15\t0.3\t46\t26\n0.53\t1.8\t40\t20";
const paste = {
  summary: "Paste",
  text: TABLE,
  onText: nothing,
  frequencyUnit: "MHz",
  onAdd: nothing,
};

describe("a pasted table", () => {
  test("shows what each line will be before anything is added", () => {
    const html = renderToStaticMarkup(<PasteTable {...paste} unit="" />);
    expect(html).toContain("Nothing is added yet.");
    expect(html).toContain("a new line; peak detector; 2 segments in 2 bands, with a gap between");
    expect(html).toContain("530 kHz");
    expect(html).toMatch(/<button(?![^>]* disabled="")[^>]*>Add 4 segments</);
  });

  test("keeps its text and is not added when its unit is another or it makes several lines of one", () => {
    const other = renderToStaticMarkup(<PasteTable {...paste} unit="dBuV" />);
    expect(other).toContain("in dBµV/m, this mask&#x27;s in dBµV.");
    expect(other).toMatch(/<button[^>]* disabled=""/);
    expect(other).toContain("0.53\t1.8\t40\t20");
    const line = emptyLine(() => 1);
    const into = renderToStaticMarkup(<PasteTable {...paste} unit="dBuV/m" line={line} />);
    expect(into).toContain("This table makes 2 lines");
    expect(into).toMatch(/<button[^>]* disabled=""/);
    const quasi = { ...line, detector: "quasi-peak" as const };
    const one = { ...paste, text: "start\tstop\tPK\n30\t88\t40" };
    expect(renderToStaticMarkup(<PasteTable {...one} unit="" line={quasi} />)).toContain(
      "for another detector",
    );
  });
});

test("the confirmation form has a box for every row and none is ticked beforehand", () => {
  const refuse = async () => ({ ok: false as const, message: "", fieldErrors: {} });
  const html = renderToStaticMarkup(
    <ConfirmMaskForm
      maskId="m"
      revision={1}
      mask={{ ...MASK, edition: "not stated" }}
      confirm={refuse}
    />,
  );
  const boxes = html.match(/<input[^>]*type="checkbox"[^>]*>/g) ?? [];
  // Two rows, the line as a whole, and the sentence at the end.
  expect(boxes).toHaveLength(4);
  expect(boxes.some((box) => box.includes("checked"))).toBe(false);
  expect(html).toContain("2 of 2 rows are not ticked off yet.");
  expect(html).toContain("Quasi-peak, 230 MHz to 1 GHz agrees with my copy");
  expect(html).toMatch(/name="edition"[^>]*value=""|value=""[^>]*name="edition"/);
});

test("a mark stands beside a mask from memory only, in words", () => {
  expect(renderToStaticMarkup(<UnconfirmedMark provenance="from memory" />)).toContain(
    "from memory, not confirmed",
  );
  expect(renderToStaticMarkup(<UnconfirmedMark provenance="team" />)).toBe("");
});

test("hints are said to keep nothing back, and are left out where there are none", () => {
  expect(renderToStaticMarkup(<MaskHintList mask={MASK} />)).toBe("");
  const html = renderToStaticMarkup(<MaskHintList mask={{ ...MASK, distanceM: null }} />);
  expect(html).toContain("none of it keeps the mask back");
  expect(html).toContain("No measuring distance");
});
