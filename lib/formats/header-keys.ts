export type HeaderKey =
  | "rbw"
  | "vbw"
  | "vbwEnabled"
  | "detector"
  | "hold"
  | "sweepTime"
  | "attenuation"
  | "preamplifier"
  | "referenceLevel"
  | "points"
  | "start"
  | "stop"
  | "frequencyUnit"
  | "levelUnit"
  | "traceName"
  | "date"
  | "polarization"
  | "distance"
  | "height";

/** Spellings by key, squeezed to letters and digits. */
const SPELLINGS: Record<HeaderKey, string[]> = {
  rbw: [
    "rbw resolutionbandwidth resbandwidth resbw resolutionbw ifbw ifbandwidth measbw measbandwidth",
    "measurementbandwidth rbwbandwidth rbwfilter aufloesebandbreite auflösebandbreite",
  ],
  vbw: ["vbw videobandwidth videobw vidbw videobandbreite"],
  vbwEnabled: ["vbwenable vbwenabled videobandwidthenable videobandwidthenabled vbwstate"],
  detector: ["detector detection tracedetector detectortype detectormode det detektor"],
  hold: ["tracemode tracetype function hold tracehold tracefunction displaymode spurmodus"],
  sweepTime: ["sweeptime swt swptime sweeptm sweepduration sweepzeit setsweeptime"],
  attenuation: [
    "attenuation rfattenuation rfatt inputatten inputattenuation inputatt att attenuator attn",
    "rfatten dämpfung",
  ],
  preamplifier: ["preamplifier preamp preampstate preamplifierstate preampset vorverstärker"],
  referenceLevel: ["referencelevel reflevel ref reflvl referenzpegel"],
  points: [
    "points numberofpoints numpoints numberpoints values bins sweeppoints datapoints noofpoints",
    "tracepoints npoints pointcount nbpoints",
  ],
  start: ["start startfreq startfrequency xstart fstart freqstart frequencystart startfrequenz"],
  stop: [
    "stop stopfreq stopfrequency xstop fstop freqstop frequencystop stopfrequenz end endfrequency",
  ],
  frequencyUnit: ["xunit xunits xaxisunit xaxisunits frequnit frequencyunit frequencyunits"],
  levelUnit: [
    "yunit yunits yaxisunit yaxisunits unit units dataunit levelunit levelunits amplitudeunit",
    "amplitudeunits tracedataunit traceunit",
  ],
  traceName: ["tracename trace tracelabel tracetitle"],
  date: [
    "date datetime timestamp measuredon measurementdate datum measuredat acquisitiondate testdate",
    "tracetimestamp datetimeoftest",
  ],
  polarization: ["polarization polarisation antennapolarization pol"],
  distance: ["distance measurementdistance measuringdistance antennadistance"],
  height: ["height antennaheight mastheight"],
};

const BY_SPELLING = new Map<string, HeaderKey>(
  Object.entries(SPELLINGS).flatMap(([key, lists]) =>
    lists.flatMap((list) => list.split(" ").map((word) => [word, key as HeaderKey] as const)),
  ),
);

/** Setting that a header's words name; the unit in brackets is not part of the name. */
export function headerKeyOf(text: string): HeaderKey | null {
  const word = text
    .replace(/[[(][^\])]*[\])]?/g, "")
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, "");
  return BY_SPELLING.get(word) ?? null;
}
