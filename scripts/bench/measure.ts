/** What a benchmark was measured against; seconds is null where the peer is not installed. */
export type Peer = { peer: string; seconds: number | null };

/** What is hoped for; a miss is no failure. */
export type Wanted = { atMost?: number; ratioAtLeast?: number };

export type Benchmark = {
  name: string;
  unit: 's' | 'ms' | 'µs' | 'ns';
  /** things done by one run */
  n: number;
  seconds: number;
  peer?: Peer;
  wanted?: Wanted;
};

const PER_SECOND = { s: 1, ms: 1e3, µs: 1e6, ns: 1e9 };

/**
 * Median time of a run in seconds, after warm-up.
 *
 * @param run   does the work; what it returns is summed and looked at, so that none of it can be left out
 * @param last  least time of warm-up, and of the repeats (at least five)
 */
export function medianSeconds(run: () => number, last = { warmupSeconds: 1, seconds: 2 }): number {
  let looked = 0;
  const timed = () => {
    const began = performance.now();
    looked += run();
    return (performance.now() - began) / 1000;
  };
  for (let spent = 0; spent < last.warmupSeconds;) spent += timed();
  const times: number[] = [];
  for (let spent = 0; spent < last.seconds || times.length < 5;) {
    const seconds = timed();
    times.push(seconds);
    spent += seconds;
  }
  if (!Number.isFinite(looked)) throw new Error(`A run gave ${looked}`);
  return times.sort((a, b) => a - b)[times.length >> 1] ?? NaN;
}

/** Prints a benchmark's line. */
export function report({ name, unit, n, seconds, peer, wanted }: Benchmark): void {
  const value = seconds * PER_SECOND[unit];
  const peerValue = peer && peer.seconds !== null ? peer.seconds * PER_SECOND[unit] : null;
  const line = {
    name,
    value: digits(value),
    unit,
    n,
    peer: peer?.peer ?? null,
    peerValue: peerValue === null ? null : digits(peerValue),
    ratio: peerValue === null ? null : digits(peerValue / value),
    ...(wanted && { wanted }),
  };
  console.log(JSON.stringify(line));
}

function digits(value: number): number {
  return Number(value.toPrecision(4));
}
