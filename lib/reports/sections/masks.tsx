import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import type { Mask, MaskLine, MaskSegment } from "@/lib/core/mask/mask";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { Facts, Paragraph, SectionTitle, SubTitle, Warning } from "../parts/blocks";
import { Table } from "../parts/table";
import { PORT_LABELS, PROVENANCE_LABELS } from "../report-labels";
import { markOfMask } from "../mask-mark";
import type { ReportContent, SnapshotMask } from "../report-content";
import { stateFrequency, stateValue } from "../report-text";

/** Every mask that a sweep was held against, also those with which it could not be compared. */
function distinctMasks(content: ReportContent): SnapshotMask[] {
  const held = content.sweeps.flatMap((sweep) => sweep.readings);
  return [...new Map(held.map((one) => [one.maskRevisionId, one])).values()];
}

function limitText(segment: MaskSegment, mask: Mask): string {
  const from = formatLevel(segment.startDb, mask.unit);
  if (segment.startDb === segment.stopDb) return from;
  const law = segment.interpolation === "log" ? "log f" : "f";
  return `${from} to ${formatLevel(segment.stopDb, mask.unit)}, linear in ${law}`;
}

function segmentRows(mask: Mask, line: MaskLine) {
  const kind = line.rbwKind === null ? "" : ` (${line.rbwKind.replace("dB", " dB")})`;
  return line.segments.map((segment, i) => [
    i === 0 ? line.name : "",
    i === 0 ? DETECTOR_LABELS[line.detector] : "",
    i === 0 ? `${stateFrequency(line.rbwHz)}${line.rbwHz === null ? "" : kind}` : "",
    formatFrequency(segment.startHz),
    formatFrequency(segment.stopHz),
    limitText(segment, mask),
  ]);
}

function MaskBlock({ mask, maskRevision, confirmation }: SnapshotMask) {
  const isUnconfirmed = mask.provenance === "from memory" && !confirmation;
  return (
    <>
      <SubTitle aheadPt={96}>{`${mask.title} · revision ${maskRevision}`}</SubTitle>
      {confirmation ? (
        <Paragraph>{`Limits ${markOfMask(mask.provenance, confirmation) ?? ""}.`}</Paragraph>
      ) : null}
      {isUnconfirmed ? (
        <Warning>
          FROM MEMORY, not confirmed: this mask was written down from memory and not read from the
          document. Confirm it against your own copy before anything rests on it.
        </Warning>
      ) : null}
      <Facts
        facts={[
          { label: "Document", value: mask.document || "not stated" },
          { label: "Clause", value: mask.clause || "not stated" },
          { label: "Edition", value: mask.edition || "not stated" },
          {
            label: "Provenance",
            value: confirmation ? "confirmed by the team" : PROVENANCE_LABELS[mask.provenance],
            warn: isUnconfirmed,
          },
          { label: "Port", value: PORT_LABELS[mask.port] },
          { label: "Distance", value: stateValue(mask.distanceM, "m"), kind: "number" },
          { label: "Unit", value: LEVEL_UNIT_LABELS[mask.unit], kind: "number" },
        ]}
      />
      {mask.note === "" ? null : <Paragraph soft>{mask.note}</Paragraph>}
      <Table
        columns={[
          { title: "Line", share: 1.5, longest: 18 },
          { title: "Detector", share: 1.2 },
          { title: "Bandwidth", share: 1.6, kind: "number" },
          { title: "From", share: 1.2, kind: "number", align: "right" },
          { title: "To", share: 1.2, kind: "number", align: "right" },
          { title: "Limit", share: 2.9, kind: "number" },
        ]}
        rows={mask.lines.flatMap((line) => segmentRows(mask, line))}
      />
    </>
  );
}

/** Each mask revision that a sweep was held against, with its source. */
export function Masks({ snapshot }: { snapshot: ReportContent }) {
  const masks = distinctMasks(snapshot);
  return (
    <>
      <SectionTitle>Masks</SectionTitle>
      {masks.length === 0 ? <Paragraph>No sweep was held against a mask.</Paragraph> : null}
      {masks.map((held, i) => (
        <MaskBlock key={i} {...held} />
      ))}
    </>
  );
}
