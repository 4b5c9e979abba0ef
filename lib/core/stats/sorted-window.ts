/** Values of a sliding window, kept in order: percentiles of it are then a look-up. */
export class SortedWindow {
  private readonly values: Float32Array;
  private size = 0;

  constructor(capacity: number) {
    this.values = new Float32Array(capacity);
  }

  /** First place whose value is not below `value`. */
  private placeOf(value: number): number {
    let low = 0;
    let high = this.size;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.values[middle] ?? 0) < value) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  add(value: number): void {
    const place = this.placeOf(value);
    this.values.copyWithin(place + 1, place, this.size);
    this.values[place] = value;
    this.size += 1;
  }

  remove(value: number): void {
    const place = this.placeOf(value);
    this.values.copyWithin(place, place + 1, this.size);
    this.size -= 1;
  }

  /** Takes `out` away and puts `value` in, moving only what lies between the two. */
  replace(out: number, value: number): void {
    const from = this.placeOf(out);
    const to = this.placeOf(value);
    if (to > from) {
      this.values.copyWithin(from, from + 1, to);
      this.values[to - 1] = value;
    } else {
      this.values.copyWithin(to + 1, to, from);
      this.values[to] = value;
    }
  }

  /** Percentile (0…100), linear between ranks; NaN when the window is empty. */
  percentile(percent: number): number {
    if (this.size === 0) return Number.NaN;
    const rank = ((this.size - 1) * percent) / 100;
    const low = Math.floor(rank);
    const below = this.values[low] ?? Number.NaN;
    const above = this.values[Math.min(low + 1, this.size - 1)] ?? below;
    return below + (above - below) * (rank - low);
  }
}
