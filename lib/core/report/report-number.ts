/** The number of a report as it is printed and spoken: "R-0007". */
export function formatReportNumber(number: number): string {
  return `R-${String(number).padStart(4, "0")}`;
}
