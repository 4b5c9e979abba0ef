const NUMBER_AND_UNIT =
  /(\d) (?=(?:[kMGTmµn]?Hz|dB[\wµΩ/√²]*|[kmcµ]?m|[kMG]?b\/s|[kMm]?V|[mkM]?Ω|[mµnp]?s|ppm|%)(?![\w]))/g;

/** Text in which no line breaks between a number and its unit: "CISPR 25 class 5, 1 m". */
export function keepUnits(text: string): string {
  return text.replace(NUMBER_AND_UNIT, "$1\u00a0");
}
