import { Circle, ClipPath, Defs, G, Line, Path, Rect, Svg, Text, View } from "@react-pdf/renderer";
import { Words } from "../parts/words";
import { basisOf } from "@/lib/core/reading/basis";
import type { Detector } from "@/lib/core/sweep/settings";
import { convertLevel } from "@/lib/core/units/convert-level";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import type { SnapshotSweep } from "../report-content";
import type { Deciding } from "../summarize";
import { COLOURS, TYPE } from "../style";
import { isOfSweep, worstSuspects } from "../worst-of-combined";
import { captionOf } from "./caption";
import { AxisLabels, Grid, TICK } from "./axes";
import {
  coastPath,
  frameOf,
  hatchPath,
  landPath,
  placeBuoys,
  placeLineNames,
  spotsOf,
  tracePath,
  waterPath,
} from "./coast-geometry";

const LINE_DASHES: Partial<Record<Detector, string>> = {
  peak: "7 2.5",
  average: "3 2",
  "rms-average": "6 2 1.5 2",
};

interface CoastChartProps {
  deciding: Deciding;
  widthPt: number;
  heightPt: number;
  /** Only its room counts: nothing is drawn. */
  isMeasured: boolean;
}

/** Traces that can be drawn in the chart's unit, each with the dB that restate it. */
function drawable(sweep: SnapshotSweep, unit: SnapshotSweep["traces"][number]["unit"]) {
  return sweep.traces.flatMap((trace, index) => {
    const shiftDb = convertLevel(0, trace.unit, unit, sweep.bench.impedanceOhm);
    return shiftDb === null ? [] : [{ trace, shiftDb, index }];
  });
}

/** The sweep as water under a coast: land above the mask, buoys at those of the five worst suspects
 * that it shows. */
export function CoastChart({ deciding, widthPt, heightPt, isMeasured }: CoastChartProps) {
  const { sweep, held, combined, point } = deciding;
  const mask = combined?.mask ?? held?.mask ?? null;
  const unit = held?.reading.unit ?? sweep.traces[0]?.unit ?? "dB";
  const drawn = drawable(sweep, unit);
  const box = { left: 26, right: widthPt - 2, top: 11, bottom: heightPt - 14 };
  const frame = frameOf(drawn, mask, box);
  if (!frame)
    return (
      <View style={{ height: 44, backgroundColor: COLOURS.water1, padding: 14 }}>
        <Text style={TYPE.body}>The sweep has no levels that could be drawn.</Text>
      </View>
    );
  const scans = drawn.filter(({ trace }) => trace.kind === "scan");
  const main = scans.find(({ index }) => index === point?.traceIndex) ?? scans[0];
  const spots = drawn.filter(({ trace }) => trace.kind === "spots");
  const lines = mask?.lines ?? [];
  const land = landPath(frame, lines);
  // Only where the trace has the line's own detector does it run aground.
  const decided = lines.filter((l) => main && basisOf(main.trace, l.detector) === "like-for-like");
  const agroundLand = landPath(frame, decided);
  const buoys = placeBuoys(frame, worstSuspects(deciding).filter(isOfSweep(deciding)));
  const labels = placeLineNames(frame, lines);
  const frameRect = {
    x: frame.left,
    y: frame.top,
    width: frame.right - frame.left,
    height: frame.bottom - frame.top,
  };
  const caption = captionOf(sweep, main, scans, spots, mask?.title ?? null, drawn.length);
  return (
    <View wrap={false}>
      <View style={{ width: widthPt, height: heightPt, position: "relative" }}>
        {isMeasured ? null : (
          <Svg viewBox={`0 0 ${widthPt} ${heightPt}`} style={{ width: widthPt, height: heightPt }}>
            <Defs>
              <ClipPath id="land">
                <Path d={land || "M0 0"} />
              </ClipPath>
              <ClipPath id="aground">
                <Path d={agroundLand || "M0 0"} />
              </ClipPath>
            </Defs>
            <Rect {...frameRect} fill={COLOURS.paper} />
            {land ? <Path d={land} fill={COLOURS.land} fillOpacity={0.72} /> : null}
            {land ? (
              <G clipPath="url(#land)">
                <Path
                  d={hatchPath(frame)}
                  stroke={COLOURS.landEdge}
                  strokeWidth={0.3}
                  strokeOpacity={0.55}
                />
              </G>
            ) : null}
            {main ? (
              <Path d={waterPath(frame, main)} fill={COLOURS.water2} fillOpacity={0.85} />
            ) : null}
            <Grid frame={frame} />
            {scans
              .filter((scan) => scan !== main)
              .map((scan) => (
                <Path
                  key={scan.index}
                  d={tracePath(frame, scan)}
                  fill="none"
                  stroke={COLOURS.inkSoft}
                  strokeWidth={0.55}
                />
              ))}
            {main ? (
              <Path
                d={tracePath(frame, main)}
                fill="none"
                stroke={COLOURS.deep}
                strokeWidth={0.7}
                strokeLinejoin="round"
              />
            ) : null}
            {main && agroundLand ? (
              <G clipPath="url(#aground)">
                <Path
                  d={tracePath(frame, main)}
                  fill="none"
                  stroke={COLOURS.aground}
                  strokeWidth={1.1}
                />
              </G>
            ) : null}
            {lines.map((line, i) => (
              <Path
                key={i}
                d={coastPath(frame, line)}
                fill="none"
                stroke={COLOURS.landEdge}
                strokeWidth={1.3}
                {...(LINE_DASHES[line.detector]
                  ? { strokeDasharray: LINE_DASHES[line.detector] }
                  : {})}
              />
            ))}
            {spots.flatMap((drawnSpots) =>
              spotsOf(frame, drawnSpots).map(({ x, y }, i) => (
                <Circle
                  key={`${drawnSpots.index} ${i}`}
                  cx={x}
                  cy={y}
                  r={1.7}
                  fill={COLOURS.sheet}
                  stroke={COLOURS.ink}
                  strokeWidth={0.7}
                />
              )),
            )}
            {buoys.map(({ number, x, y, peakX, peakY }) => (
              <G key={number}>
                <Line
                  x1={x}
                  x2={peakX}
                  y1={y + 5}
                  y2={peakY - 1}
                  stroke={COLOURS.ink}
                  strokeWidth={0.5}
                />
                <Circle
                  cx={x}
                  cy={y}
                  r={5}
                  fill={COLOURS.sheet}
                  stroke={COLOURS.ink}
                  strokeWidth={0.7}
                />
              </G>
            ))}
            <Rect {...frameRect} fill="none" stroke={COLOURS.inkSoft} strokeWidth={0.6} />
          </Svg>
        )}
        <AxisLabels frame={frame} unitLabel={LEVEL_UNIT_LABELS[unit]} />
        {labels.map(({ text, x, y }) => (
          <Text
            key={text}
            style={{
              ...TYPE.small,
              fontSize: 6.8,
              lineHeight: 1,
              fontWeight: 600,
              position: "absolute",
              left: x,
              top: y,
              width: 200,
            }}
          >
            {text}
          </Text>
        ))}
        {buoys.map(({ number, x, y }) => (
          <Text
            key={number}
            style={{
              ...TICK,
              fontWeight: 500,
              color: COLOURS.ink,
              position: "absolute",
              left: x - 7,
              top: y - 3.1,
              width: 14,
              textAlign: "center",
            }}
          >
            {String(number)}
          </Text>
        ))}
      </View>
      <Words style={{ ...TYPE.small, color: COLOURS.inkSoft, marginTop: 2 }} longest={80}>
        {caption}
      </Words>
    </View>
  );
}
