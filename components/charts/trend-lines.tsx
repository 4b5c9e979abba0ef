import type { PreparedTrend } from "./prepare-trend";
import { StandingMark } from "./standing-shape";

const ROW_PX = 13;

/** One line per mask with the builds as standing marks and the mask's name at its end. */
export function TrendLines({ prepared, width }: { prepared: PreparedTrend; width: number }) {
  const nameX = width - prepared.margin.right + 12;
  return (
    <g>
      {prepared.lines.map(({ key, path, style }) => (
        <path
          key={key}
          d={path}
          fill="none"
          stroke={style.stroke}
          strokeWidth="1.5"
          strokeDasharray={style.dash}
          strokeLinejoin="round"
        />
      ))}
      {(prepared.compact ? [] : prepared.names).map(({ key, rows, last, y, fromX, fromY }, i) => {
        const first = y - (rows.length * ROW_PX) / 2 + 4;
        const style = prepared.lines[i]?.style;
        return (
          <g key={key} fontSize="11" fill="var(--ink)">
            <path
              d={`M${fromX + 8},${fromY}L${nameX - 3},${y}`}
              stroke={style?.stroke}
              strokeWidth="0.75"
              strokeDasharray={style?.dash}
            />
            {rows.map((row, at) => (
              <text key={at} x={nameX} y={first + at * ROW_PX} fontWeight="500">
                {row}
              </text>
            ))}
            <text x={nameX} y={first + rows.length * ROW_PX} className="font-mono">
              {last}
            </text>
          </g>
        );
      })}
      {prepared.lines.map(({ key, marks }) => (
        <g key={key}>
          {marks.map((mark, i) => (
            <StandingMark key={i} standing={mark.standing} x={mark.x} y={mark.y} radius={5} />
          ))}
        </g>
      ))}
    </g>
  );
}
