import { Text, View } from "@react-pdf/renderer";
import { formatMargin } from "@/lib/core/units/format";
import { Words } from "../parts/words";
import { Facts, Paragraph, SectionTitle } from "../parts/blocks";
import { Table } from "../parts/table";
import { NOT_STATED } from "../report-labels";
import type { ReportContent } from "../report-content";
import type { ReportState } from "../report-snapshot";
import { formatInstant } from "../report-text";
import { COLOURS, TYPE } from "../style";

interface RecordProps {
  snapshot: ReportContent;
  state: ReportState;
}

/** The item, the people and dates of the report. */
export function ItemAndPeople({ snapshot, state }: RecordProps) {
  const { program, build } = snapshot;
  return (
    <>
      <SectionTitle>Item tested and this report</SectionTitle>
      <Facts
        facts={[
          { label: "Program", value: program.name },
          { label: "Build", value: build.name },
          { label: "Built on", value: build.builtOn ?? NOT_STATED, kind: "number" },
          { label: "Target margin", value: formatMargin(program.targetMarginDb), kind: "number" },
          { label: "Team", value: snapshot.team },
          { label: "Issued by", value: snapshot.issuedBy },
          { label: "Issued", value: formatInstant(snapshot.issuedAt), kind: "number" },
          { label: "Replaces", value: snapshot.replaces ?? "no earlier report", kind: "number" },
          { label: "Approved by", value: state.approvedBy ?? "not approved" },
          {
            label: "Approved",
            value: state.approvedAt === null ? "not approved" : formatInstant(state.approvedAt),
            kind: state.approvedAt === null ? "text" : "number",
          },
        ]}
      />
      {program.description === "" ? null : <Paragraph>{program.description}</Paragraph>}
      {build.notes === "" ? null : <Paragraph>{`Notes on the build: ${build.notes}`}</Paragraph>}
      {snapshot.summary.trim() === "" ? null : (
        <View style={{ marginTop: 4 }}>
          <Text style={TYPE.label}>Summary by the issuer</Text>
          <Paragraph>{snapshot.summary.trim()}</Paragraph>
        </View>
      )}
    </>
  );
}

/** Original files, what the report relates to, and its end. */
export function Records({ snapshot }: Pick<RecordProps, "snapshot">) {
  return (
    <>
      <SectionTitle>Original files and content</SectionTitle>
      <Table
        columns={[
          { title: "Sweep and file", share: 2.3, longest: 36 },
          { title: "SHA-256 of the original file", share: 3, kind: "number", longest: 80 },
        ]}
        rows={snapshot.sweeps.map((sweep) => [
          <View key="file">
            <Words style={TYPE.body} longest={36}>
              {sweep.name}
            </Words>
            <Words style={{ ...TYPE.number, fontSize: 7 }} longest={50}>
              {sweep.fileName}
            </Words>
          </View>,
          <Text key="hash" style={{ ...TYPE.number, fontSize: 6.9 }}>
            {sweep.fileSha256}
          </Text>,
        ])}
      />
      <View style={{ marginTop: 8 }}>
        <Paragraph>
          The content SHA-256 at the foot of each page is that of everything this report says; it
          changes with any value. Approval and withdrawal are printed beside it and are not part of
          it.
        </Paragraph>
      </View>
      <View
        wrap={false}
        style={{
          marginTop: 14,
          borderTopWidth: 0.8,
          borderTopColor: COLOURS.deep,
          paddingTop: 6,
          alignItems: "center",
        }}
      >
        <Text style={TYPE.body}>This report relates only to the item tested.</Text>
        <Text style={{ ...TYPE.h3, marginTop: 3 }}>End of report</Text>
      </View>
    </>
  );
}
