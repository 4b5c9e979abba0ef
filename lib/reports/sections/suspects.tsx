import { Text, View } from "@react-pdf/renderer";
import type { Suspect } from "@/lib/core/reading/reading";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { Label, Paragraph } from "../parts/blocks";
import type { Column } from "../parts/table";
import { Table } from "../parts/table";
import { Words } from "../parts/words";
import { BASIS_LABELS } from "../report-labels";
import type { SnapshotReading, SnapshotSweep } from "../report-content";
import { COLOURS, TYPE } from "../style";

interface SuspectsProps {
  held: SnapshotReading;
  sweep: SnapshotSweep;
}

const COLUMNS: readonly Column[] = [
  { title: "No.", share: 0.45, kind: "number", align: "right" },
  { title: "Frequency", share: 1.35, kind: "number", align: "right" },
  { title: "Level", share: 1.35, kind: "number", align: "right" },
  { title: "Limit", share: 1.35, kind: "number", align: "right" },
  { title: "Margin", share: 1.05, kind: "number", align: "right" },
  { title: "Prominence", share: 1.15, kind: "number", align: "right" },
  { title: "Line", share: 2.1, kind: "small", longest: 20 },
  { title: "Basis", share: 1.2, kind: "small" },
];

/** The basis stands under the line here, so that no level wraps. */
const WITH_AMBIENT: readonly Column[] = [
  { title: "No.", share: 0.45, kind: "number", align: "right" },
  { title: "Frequency", share: 1.3, kind: "number", align: "right" },
  { title: "Level", share: 1.4, kind: "number", align: "right" },
  { title: "Limit", share: 1.4, kind: "number", align: "right" },
  { title: "Margin", share: 1.1, kind: "number", align: "right" },
  { title: "Prominence", share: 1.2, kind: "number", align: "right" },
  { title: "Line", share: 1.75, kind: "small", longest: 16 },
  { title: "Ambient", share: 1.4, kind: "number", align: "right" },
  { title: "Without it", share: 1.4, kind: "number", align: "right" },
];

/** "followed as no. 3, open", or that it only lies beside one. */
function followedText({ followed }: SnapshotReading, number: number): string | null {
  const own = followed.find((one) => one.number === number);
  if (!own) return null;
  const { followedNumber, state, isSame } = own;
  return isSame ? `followed as no. ${followedNumber}, ${state}` : `beside no. ${followedNumber}`;
}

function lineCell(held: SnapshotReading, suspect: Suspect) {
  const followed = followedText(held, suspect.number);
  const isLikely = held.ambient.some((one) => one.number === suspect.number && one.isLikelyAmbient);
  return (
    <View key="line">
      <Words style={TYPE.small} longest={18}>
        {suspect.lineName ?? "no line"}
      </Words>
      {held.ambient.length > 0 ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>{BASIS_LABELS[suspect.basis]}</Text>
      ) : null}
      {isLikely ? (
        <Text style={{ ...TYPE.small, fontWeight: 600, color: COLOURS.shoal }}>likely ambient</Text>
      ) : null}
      {followed === null ? null : (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft }}>{followed}</Text>
      )}
    </View>
  );
}

/** All suspects of a reading, with their ambient where a comparable ambient sweep covers them. */
export function Suspects({ held, sweep }: SuspectsProps) {
  const { reading, ambient } = held;
  const hasAmbient = ambient.length > 0;
  return (
    <>
      <Label>{`Suspects (${reading.suspects.length}), the lowest margin first`}</Label>
      {reading.suspects.length === 0 ? (
        <Paragraph soft>No peak within reach of the mask stands out.</Paragraph>
      ) : (
        <Table
          columns={hasAmbient ? WITH_AMBIENT : COLUMNS}
          rows={reading.suspects.map((suspect) => {
            const own = ambient.find((one) => one.number === suspect.number);
            const stepHz = sweep.traces[suspect.traceIndex]?.stepHz ?? undefined;
            const without = own?.withoutAmbientDb ?? null;
            const ambientCells = [
              own ? formatLevel(own.ambientDb, reading.unit) : "not known",
              own ? (without === null ? "nothing left" : formatLevel(without, reading.unit)) : "–",
            ];
            return [
              String(suspect.number),
              formatFrequency(suspect.frequencyHz, stepHz),
              formatLevel(suspect.levelDb, reading.unit),
              suspect.limitDb === null ? "no limit" : formatLevel(suspect.limitDb, reading.unit),
              formatMargin(suspect.marginDb),
              `${suspect.prominenceDb.toFixed(1)} dB`,
              lineCell(held, suspect),
              ...(hasAmbient ? ambientCells : [BASIS_LABELS[suspect.basis]]),
            ];
          })}
        />
      )}
      {hasAmbient ? (
        <Text style={{ ...TYPE.small, color: COLOURS.inkSoft, marginTop: 2 }}>
          {`"Without it" is the level less the ambient by power, an estimate for noise-like signals; margins are of the level as read.`}
        </Text>
      ) : null}
    </>
  );
}
