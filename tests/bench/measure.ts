/** Middle of the values; the mean of the two middle ones when they are even in number. */
export function middleOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  const high = sorted[half] ?? Number.NaN;
  return sorted.length % 2 === 1 ? high : ((sorted[half - 1] ?? Number.NaN) + high) / 2;
}

type Work = (round: number) => unknown;

async function timeMs(work: Work, round: number): Promise<number> {
  globalThis.gc?.();
  const from = performance.now();
  await work(round);
  return performance.now() - from;
}

/**
 * Milliseconds of each work in each round, after rounds that only warm up. The works take turns
 * within a round, forwards and backwards, so that a busy machine weighs on all of them alike.
 */
export async function measureInTurns<Name extends string>(
  works: Record<Name, Work>,
  rounds: number,
  warmUps = 2,
): Promise<Record<Name, number[]>> {
  const names = Object.keys(works) as Name[];
  const times = Object.fromEntries(names.map((name) => [name, []])) as unknown as Record<
    Name,
    number[]
  >;
  for (let round = 0; round < warmUps + rounds; round += 1) {
    for (const name of round % 2 === 0 ? names : [...names].reverse()) {
      const ms = await timeMs(works[name], round);
      if (round >= warmUps) times[name].push(ms);
    }
  }
  return times;
}

/** Quotients of the two times of each round. */
export function quotients(above: readonly number[], below: readonly number[]): number[] {
  return above.map((ms, i) => ms / (below[i] ?? Number.NaN));
}

/** "min 2.10, median 2.34". */
export function minAndMedian(values: readonly number[], digits = 2): string {
  return `min ${Math.min(...values).toFixed(digits)}, median ${middleOf(values).toFixed(digits)}`;
}

export const milliseconds = (values: readonly number[]) => `${middleOf(values).toFixed(1)} ms`;
