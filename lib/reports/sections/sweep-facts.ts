import type { LinkSettings } from "@/lib/core/link/link-settings";
import { formatFrequency } from "@/lib/core/units/format";
import { shorten } from "../printable";
import type { Fact } from "../parts/blocks";
import {
  CODING_LABELS,
  NOT_STATED,
  PAYLOAD_LABELS,
  PORT_LABELS,
  PURPOSE_LABELS,
  SCRAMBLER_LABELS,
  SPREAD_DIRECTION_LABELS,
} from "../report-labels";
import type { SnapshotSweep } from "../report-content";
import { formatBandwidth, formatInstant, stateFrequency, stateValue } from "../report-text";

const listText = (names: readonly string[]) =>
  names.length === 0 ? "none known" : names.map((name) => shorten(name, 60)).join("; ");

/** Whether the build's trend counts the sweep; a report of version 1 did not know. */
function recordText({ onRecord, purpose }: SnapshotSweep): string {
  if (onRecord === null) return NOT_STATED;
  if (purpose !== "product") return "no product sweep";
  return onRecord ? "yes, it counts for the trend" : "no, a try";
}

export function sweepFacts(sweep: SnapshotSweep): Fact[] {
  const { bench } = sweep;
  return [
    { label: "Purpose", value: PURPOSE_LABELS[sweep.purpose] },
    { label: "Measured on", value: sweep.measuredOn ?? NOT_STATED, kind: "number" },
    { label: "Imported by", value: sweep.importedBy },
    { label: "Imported", value: formatInstant(sweep.importedAt), kind: "number" },
    { label: "Bench", value: bench.name },
    { label: "Site", value: bench.site || NOT_STATED },
    { label: "Instrument", value: bench.instrument || NOT_STATED },
    { label: "On record", value: recordText(sweep) },
    { label: "Ambient sweeps", value: listText(sweep.ambientSweeps) },
    { label: "Floor sweeps", value: listText(sweep.floorSweeps) },
    { label: "Impedance", value: `${bench.impedanceOhm} Ω`, kind: "number" },
  ];
}

export function settingFacts({ settings, bench }: SnapshotSweep): Fact[] {
  const preamplifier =
    settings.preamplifier === null ? NOT_STATED : settings.preamplifier ? "on" : "off";
  const number = (label: string, value: string): Fact => ({ label, value, kind: "number" });
  return [
    number("RBW", formatBandwidth(settings)),
    number("VBW", stateFrequency(settings.vbwHz)),
    number("Sweep time", stateValue(settings.sweepTimeS, "s")),
    number("Attenuation", stateValue(settings.attenuationDb, "dB")),
    { label: "Preamplifier", value: preamplifier },
    number("Reference level", stateValue(settings.referenceLevelDb, "dB")),
    { label: "Port", value: PORT_LABELS[settings.port] },
    { label: "Polarization", value: settings.polarization ?? NOT_STATED },
    number("Antenna height", stateValue(settings.heightM, "m")),
    number("Azimuth", stateValue(settings.azimuthDeg, "°")),
    number("Distance", stateValue(settings.distanceM, "m")),
    number("Distance of the bench", stateValue(bench.distanceM, "m")),
  ];
}

/** "0.5 % down, 31.50 kHz, triangular", "off" or "not stated". */
function spreadText({ spread, spreadOff }: LinkSettings): string {
  if (spread === null) return spreadOff === true ? "off" : NOT_STATED;
  const direction = SPREAD_DIRECTION_LABELS[spread.direction];
  return `${spread.depthPercent} % ${direction}, ${formatFrequency(spread.modulationHz)}, ${spread.profile}`;
}

function bitRateText(bitRateHz: number | null): string {
  if (bitRateHz === null) return NOT_STATED;
  const [scale, unit] = bitRateHz >= 1e9 ? [1e9, "Gb/s"] : [1e6, "Mb/s"];
  return `${Number((bitRateHz / scale).toPrecision(9))} ${unit}`;
}

function edgeText(edgeTimeS: number | null): string {
  return edgeTimeS === null ? NOT_STATED : `${Number((edgeTimeS * 1e12).toPrecision(6))} ps`;
}

export function linkFacts(link: LinkSettings): Fact[] {
  const { payload, scrambler, coding } = link;
  const pattern = link.patternBits === null ? "" : `, ${link.patternBits} bits`;
  const scramblerParts = [
    scrambler === null ? NOT_STATED : SCRAMBLER_LABELS[scrambler],
    link.scramblerPolynomial,
    link.scramblerRestartBits === null ? null : `restart every ${link.scramblerRestartBits} bits`,
  ].filter((part) => part !== null);
  return [
    { label: "Bit rate", value: bitRateText(link.bitRateHz), kind: "number" },
    {
      label: "Payload",
      value: payload === null ? NOT_STATED : `${PAYLOAD_LABELS[payload]}${pattern}`,
    },
    { label: "Coding", value: coding === null ? NOT_STATED : CODING_LABELS[coding] },
    { label: "Scrambler", value: scramblerParts.join(", ") },
    { label: "Spread spectrum", value: spreadText(link) },
    { label: "Edge time", value: edgeText(link.edgeTimeS), kind: "number" },
    { label: "Cable", value: link.cable ?? NOT_STATED },
  ];
}
