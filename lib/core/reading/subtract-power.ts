/**
 * What would be left of a level if the ambient's power were taken off it: 10 log10(10^(T/10) −
 * 10^(A/10)), all in dB of one unit. An estimate for signals that add by power, as noise does:
 * two carriers at one frequency add by voltage and phase, so for those it says nothing. Shown
 * beside a level, never instead. null when the ambient is as high as the level or higher.
 */
export function subtractPower(totalDb: number, ambientDb: number): number | null {
  if (!(ambientDb < totalDb)) return null;
  // Taken off as a share of the total, so that very low levels do not vanish in rounding.
  const leftDb = totalDb + 10 * Math.log10(1 - 10 ** ((ambientDb - totalDb) / 10));
  return Number.isFinite(leftDb) ? leftDb : null;
}
