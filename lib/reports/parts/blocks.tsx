import type { ReactNode } from "react";
import { Text, View } from "@react-pdf/renderer";
import { Words } from "./words";
import { NOT_STATED } from "../report-labels";
import { COLOURS, TYPE } from "../style";
import { ShoalMark } from "./marks";

/** Heading that keeps at least `aheadPt` of what follows on its page. */
export function SectionTitle({ children, aheadPt = 130 }: { children: string; aheadPt?: number }) {
  return (
    <View
      minPresenceAhead={aheadPt}
      style={{
        marginTop: 18,
        marginBottom: 7,
        borderBottomWidth: 0.8,
        borderBottomColor: COLOURS.deep,
        paddingBottom: 3,
      }}
    >
      <Words style={{ ...TYPE.h2, color: COLOURS.deep }} longest={50}>
        {children}
      </Words>
    </View>
  );
}

export function SubTitle({ children, aheadPt = 64 }: { children: string; aheadPt?: number }) {
  return (
    <View minPresenceAhead={aheadPt} style={{ marginTop: 11, marginBottom: 4 }}>
      <Words style={TYPE.h3} longest={60}>
        {children}
      </Words>
    </View>
  );
}

export function Label({ children, aheadPt = 46 }: { children: string; aheadPt?: number }) {
  return (
    <View minPresenceAhead={aheadPt} style={{ marginTop: 8, marginBottom: 3 }}>
      <Text style={TYPE.label}>{children}</Text>
    </View>
  );
}

export function Paragraph({ children, soft = false }: { children: string; soft?: boolean }) {
  return (
    <Words
      style={{
        ...TYPE.body,
        marginBottom: 4,
        maxWidth: 470,
        ...(soft ? { color: COLOURS.inkSoft } : {}),
      }}
      longest={80}
    >
      {children}
    </Words>
  );
}

/** Sentence with a warning triangle, on the shoal tint. */
export function Warning({ children }: { children: string }) {
  return (
    <View
      wrap={false}
      style={{
        flexDirection: "row",
        gap: 5,
        backgroundColor: COLOURS.shoalTint,
        paddingVertical: 3,
        paddingHorizontal: 6,
        marginBottom: 3,
      }}
    >
      <ShoalMark />
      <View style={{ flexBasis: 0, flexGrow: 1 }}>
        <Words style={{ ...TYPE.body, color: COLOURS.shoal }} longest={70}>
          {children}
        </Words>
      </View>
    </View>
  );
}

/** A doubt among others: the triangle, and its sentence without a tint. */
export function DoubtLine({ children }: { children: string }) {
  return (
    <View wrap={false} style={{ flexDirection: "row", gap: 5, marginBottom: 2.5, maxWidth: 490 }}>
      <ShoalMark />
      <View style={{ flexBasis: 0, flexGrow: 1 }}>
        <Words style={TYPE.small} longest={70}>
          {children}
        </Words>
      </View>
    </View>
  );
}

export interface Fact {
  label: string;
  value: string;
  kind?: "text" | "number";
  warn?: boolean;
}

interface FactsProps {
  facts: readonly Fact[];
  columns?: number;
}

/** Grid of labelled values; what is not stated is said softly, never left out. */
export function Facts({ facts, columns = 4 }: FactsProps): ReactNode {
  const longest = Math.floor(88 / columns);
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap" }}>
      {facts.map(({ label, value, kind = "text", warn = false }) => {
        const unstated = value === NOT_STATED;
        const type = kind === "number" && !unstated ? TYPE.number : TYPE.body;
        const color = warn ? COLOURS.shoal : unstated ? COLOURS.inkSoft : COLOURS.ink;
        return (
          <View
            key={label}
            wrap={false}
            style={{ width: `${100 / columns}%`, paddingRight: 10, marginBottom: 5 }}
          >
            <Text style={TYPE.label}>{label}</Text>
            <Words style={{ ...type, color }} longest={longest}>
              {value}
            </Words>
          </View>
        );
      })}
    </View>
  );
}
