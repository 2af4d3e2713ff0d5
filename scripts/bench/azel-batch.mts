import { azElBatch } from '../../src/sky/az-el-batch';
import { SPAN, inventedSources, inventedStations } from './invented-sky';
import { medianSeconds, report } from './measure';
import { ROUTE, engineAzEl } from './peers/engine-route';
import { pythonSeconds } from './peers/python';

const SAMPLE = 2000;
const sources = inventedSources(300);
const sites = inventedStations(12, false).map(({ site }) => site);
const startMs = SPAN.start.getTime();
const timesMs = Array.from({ length: 24 }, (_, hour) => startMs + hour * 3_600_000);
const n = sources.length * sites.length * timesMs.length;

const seconds = medianSeconds(() => {
  const { azimuthDeg, elevationDeg } = azElBatch(sources, sites, timesMs);
  return (azimuthDeg.at(-1) ?? NaN) + (elevationDeg.at(-1) ?? NaN);
});

let looked = 0;
const began = performance.now();
for (let index = 0; index < SAMPLE; index += 1) {
  const [source, site, ms] = [
    sources[(index * 7) % sources.length],
    sites[index % sites.length],
    timesMs[index % timesMs.length],
  ];
  if (source && site && ms !== undefined) looked += engineAzEl(source, site, ms).azimuthDeg;
}
if (!Number.isFinite(looked)) throw new Error('The peer gave no azimuth');
const perPair = (performance.now() - began) / 1000 / SAMPLE;

const wanted = { ratioAtLeast: 80 };
report({
  name: 'azel-batch',
  unit: 'ms',
  n,
  seconds,
  peer: { peer: `${ROUTE}, pair by pair: ${SAMPLE} of ${n} timed and scaled`, seconds: perPair * n },
  wanted,
});

// the astrometry of a site and an instant is made once and used for all sources, as one would
const erfa = pythonSeconds(
  `
import time, numpy as np, erfa
rng = np.random.default_rng(7)
ra = 2*np.pi*rng.random(${sources.length}); dec = np.arcsin(2*rng.random(${sources.length})-1)
lon = 2*np.pi*rng.random(${sites.length}); lat = np.deg2rad(-45+115*rng.random(${sites.length}))
utc1, utc2 = 2462215.5, 0.75
best = 1e9
for turn in range(3):
    t = time.perf_counter()
    for s in range(${sites.length}):
        for k in range(${timesMs.length}):
            astrom, eo = erfa.apco13(utc1, utc2+k/24, 0.0, lon[s], lat[s], 500.0, 0, 0, 0, 0, 0, 1)
            ri, di = erfa.atciqz(ra, dec, astrom)
            aob, zob, hob, dob, rob = erfa.atioq(ri, di, astrom)
    best = min(best, time.perf_counter()-t)
print(best)
`,
  ['numpy', 'erfa'],
);
report({
  name: 'azel-batch-erfa',
  unit: 'ms',
  n,
  seconds,
  peer: {
    peer:
      erfa === null
        ? 'ERFA by python3-erfa: not installed'
        : 'ERFA apco13 + atciqz + atioq by python3-erfa, by arrays',
    seconds: erfa,
  },
  wanted: { ratioAtLeast: 8 },
});
