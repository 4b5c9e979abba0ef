import type { ReactNode } from "react";
import { Text, View } from "@react-pdf/renderer";
import { Words } from "./words";
import { COLOURS, TYPE } from "../style";

export interface Column {
  title: string;
  /** Share of the width. */
  share: number;
  align?: "left" | "right";
  kind?: "text" | "number" | "small";
  /** Words longer than this are broken. */
  longest?: number;
}

interface TableProps {
  columns: readonly Column[];
  /** Cells in the order of the columns; texts are set in the column's own type. */
  rows: readonly (readonly ReactNode[])[];
}

const CELL_TYPE = { text: TYPE.body, number: TYPE.number, small: TYPE.small };

/** Room between columns: none after the last, more where right meets left. */
function spacing(columns: readonly Column[], index: number) {
  const isLast = index === columns.length - 1;
  const meets = columns[index - 1]?.align === "right" && columns[index]?.align !== "right";
  return { paddingRight: isLast ? 0 : 8, paddingLeft: meets ? 8 : 0 };
}

interface CellProps {
  column: Column;
  room: ReturnType<typeof spacing>;
  children: ReactNode;
}

function Cell({ column, room, children }: CellProps) {
  const { kind = "text", align = "left", longest = 24 } = column;
  const alignItems = align === "right" ? ("flex-end" as const) : ("flex-start" as const);
  return (
    <View style={{ flexBasis: 0, flexGrow: column.share, ...room, alignItems }}>
      {typeof children === "string" ? (
        <Words style={{ ...CELL_TYPE[kind], textAlign: align }} longest={longest}>
          {children}
        </Words>
      ) : (
        children
      )}
    </View>
  );
}

/** Rows that never part, under a header that stands on every page they reach. */
export function Table({ columns, rows }: TableProps) {
  return (
    <>
      <View minPresenceAhead={44} />
      <View>
        <View
          fixed
          style={{
            flexDirection: "row",
            borderBottomWidth: 0.8,
            borderBottomColor: COLOURS.inkSoft,
            paddingBottom: 2,
            paddingTop: 2,
          }}
        >
          {columns.map((column, k) => (
            <View
              key={column.title}
              style={{
                flexBasis: 0,
                flexGrow: column.share,
                ...spacing(columns, k),
                justifyContent: "flex-end",
              }}
            >
              <Text style={{ ...TYPE.label, textAlign: column.align ?? "left" }}>
                {column.title}
              </Text>
            </View>
          ))}
        </View>
        {rows.map((cells, i) => (
          <View
            key={i}
            wrap={false}
            style={{
              flexDirection: "row",
              borderBottomWidth: 0.4,
              borderBottomColor: COLOURS.rule,
              paddingTop: 2.4,
              paddingBottom: 2,
            }}
          >
            {columns.map((column, k) => (
              <Cell key={column.title} column={column} room={spacing(columns, k)}>
                {cells[k]}
              </Cell>
            ))}
          </View>
        ))}
      </View>
    </>
  );
}
