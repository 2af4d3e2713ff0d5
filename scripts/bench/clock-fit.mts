import { fitClock } from '../../src/clock/fit';
import { chance } from './invented-sky';
import { medianSeconds, report } from './measure';
import { pythonSeconds } from './peers/python';

const DAYS = 60;
const PER_DAY = 144;
const next = chance(5);
const startMs = Date.UTC(2029, 0, 1);

/** Every ten minutes for sixty days: an offset, a rate, a little noise, and one reading in five hundred far off. */
const readings = Array.from({ length: DAYS * PER_DAY }, (_, index) => {
  const days = index / PER_DAY;
  const noise = (next() + next() + next() - 1.5) * 2e-8;
  const slip = next() < 0.002 ? 3e-6 : 0;
  return {
    at: new Date(startMs + days * 86_400_000),
    offsetSeconds: 2e-6 + 3e-9 * days + noise + slip,
    sigmaSeconds: 2e-8,
  };
});

const numpy = pythonSeconds(
  `
import time, numpy as np
n = ${readings.length}; t = np.arange(n)/${PER_DAY}; rng = np.random.default_rng(5)
y = 2e-6+3e-9*t+2e-8*rng.standard_normal(n); y[rng.random(n) < 0.002] += 3e-6
best = 1e9
for turn in range(20):
    began = time.perf_counter()
    keep = np.ones(n, bool)
    for step in range(10):
        x = t[keep]-t[keep].mean()
        fits = [np.polyfit(x, y[keep], d, w=np.full(keep.sum(), 5e7), cov='unscaled') for d in (1, 2)]
        off = y-np.polyval(fits[0][0], t-t[keep].mean())
        mad = 1.4826*np.median(np.abs(off[keep]-np.median(off[keep])))
        now = np.abs(off) < 5*mad
        if (now == keep).all(): break
        keep = now
    best = min(best, time.perf_counter()-began)
print(best)
`,
  ['numpy'],
);

report({
  name: 'clock-fit',
  unit: 'ms',
  n: readings.length,
  seconds: medianSeconds(() => fitClock(readings).segments.length),
  peer: {
    peer:
      numpy === null
        ? 'numpy.polyfit by python3: not installed'
        : 'numpy.polyfit, the same rounds of setting aside',
    seconds: numpy,
  },
});
