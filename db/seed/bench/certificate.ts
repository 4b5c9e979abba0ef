import type { DemoCalibration, DemoPiece } from "./demo-equipment";

export const CALIBRATION_LABORATORY = "Tidegauge Calibration Service";

/** The factors of a calibration as the table that came with it; null for an instrument. */
export function factorTable({ factors }: DemoCalibration): string | null {
  if (factors === null) return null;
  const rows = factors.map(({ frequencyHz, factorDb }) => `${frequencyHz / 1e6};${factorDb}`);
  return ["Frequency (MHz);Factor (dB)", ...rows].join("\n");
}

/** The certificate that lies with a calibration: a page of text, invented like all of the demo. */
export function makeCertificate(piece: DemoPiece, calibration: DemoCalibration): Uint8Array {
  const { calibratedOn, dueOn, certificateNumber } = calibration;
  const text = [
    "CALIBRATION CERTIFICATE",
    "Demo data: laboratory, object and values are invented.",
    "",
    `Laboratory          ${CALIBRATION_LABORATORY}`,
    `Certificate number  ${certificateNumber}`,
    `Object              ${piece.name}`,
    `Inventory number    ${piece.inventoryNumber}`,
    "Customer            Saltmarsh Optics",
    `Calibrated on       ${calibratedOn}`,
    `Next calibration    ${dueOn}, as the customer asked`,
    "",
    factorTable(calibration) ?? "Levels and frequency were found within the data sheet's limits.",
    "",
  ];
  return new TextEncoder().encode(text.join("\n"));
}
