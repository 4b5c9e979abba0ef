import { G, Line, Text } from "@react-pdf/renderer";
import { COLOURS, TYPE } from "../style";
import { frequencyTicks, levelTicks } from "./axis-ticks";
import { xOf, yOf, type Frame } from "./coast-geometry";

export const TICK = {
  ...TYPE.number,
  fontSize: 6.4,
  lineHeight: 1,
  marginTop: 0,
  color: COLOURS.inkSoft,
};

export function Grid({ frame }: { frame: Frame }) {
  const { left, right, top, bottom } = frame;
  const stroke = { stroke: COLOURS.ink, strokeWidth: 0.25, strokeOpacity: 0.16 };
  return (
    <G>
      {frequencyTicks(frame.fromHz, frame.toHz).map(({ value }) => (
        <Line
          key={value}
          x1={xOf(frame, value)}
          x2={xOf(frame, value)}
          y1={top}
          y2={bottom}
          {...stroke}
        />
      ))}
      {levelTicks(frame.fromDb, frame.toDb).map(({ value }) => (
        <Line
          key={value}
          x1={left}
          x2={right}
          y1={yOf(frame, value)}
          y2={yOf(frame, value)}
          {...stroke}
        />
      ))}
    </G>
  );
}

export function AxisLabels({ frame, unitLabel }: { frame: Frame; unitLabel: string }) {
  return (
    <>
      {frequencyTicks(frame.fromHz, frame.toHz).map(({ value, label }) => (
        <Text
          key={value}
          style={{
            ...TICK,
            position: "absolute",
            top: frame.bottom + 3.5,
            left: Math.min(xOf(frame, value) - 25, frame.right - 38),
            width: 50,
            textAlign: "center",
          }}
        >
          {label}
        </Text>
      ))}
      {levelTicks(frame.fromDb, frame.toDb).map(({ value, label }) => (
        <Text
          key={value}
          style={{
            ...TICK,
            position: "absolute",
            top: yOf(frame, value) - 3.2,
            left: 0,
            width: frame.left - 4,
            textAlign: "right",
          }}
        >
          {label}
        </Text>
      ))}
      <Text style={{ ...TICK, position: "absolute", top: 0, left: 0, width: 90 }}>{unitLabel}</Text>
    </>
  );
}
