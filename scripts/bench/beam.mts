import { dirtyBeam } from '../../src/array/beam';
import { uvTracks } from '../../src/array/uvw-tracks';
import { geodeticToItrf } from '../../src/sky/site';
import { SPAN, inventedSources, inventedStations } from './invented-sky';
import { medianSeconds, report } from './measure';
import { pythonSeconds } from './peers/python';

const SIZE = 512;
const STATIONS = 10;
const TIMES = 2222;
const WAVELENGTH_M = 0.013;
/** cells to the finest fringe */
const FINE = 6;

const places = inventedStations(STATIONS, false).map(({ site }) => geodeticToItrf(site));
const [source] = inventedSources(1);
if (!source) throw new Error('No source');
const startMs = SPAN.start.getTime();
const stepMs = (12 * 3_600_000) / TIMES;
const timesMs = Float64Array.from({ length: TIMES }, (_, index) => startMs + index * stepMs);
const tracks = () => uvTracks(places, source, timesMs, { unitM: WAVELENGTH_M });

const { u, v } = tracks();
const longest = u.reduce((most, x, index) => Math.max(most, Math.hypot(x, v[index] ?? NaN)), 0);
const grid = { size: SIZE, cellRad: 1 / longest / FINE };

const seconds = medianSeconds(() => {
  const beam = dirtyBeam(tracks(), grid);
  return (beam[0] ?? NaN) + (beam[beam.length - 1] ?? NaN);
});

// stations projected at once, each point put into its nearest cell, half-plane by bincount, real inverse transform
const numpy = pythonSeconds(
  `
import time, numpy as np, scipy.fft as sf
rng = np.random.default_rng(7)
size, lam, dec = ${SIZE}, ${WAVELENGTH_M}, 0.6
xyz = 6.4e6*rng.standard_normal((${STATIONS}, 3))
xyz *= 6.371e6/np.linalg.norm(xyz, axis=1)[:, None]
first, second = np.triu_indices(${STATIONS}, 1)
h = np.linspace(0, np.pi, ${TIMES})
def tracks():
    c, s = np.cos(h), np.sin(h); z = np.zeros_like(h)
    axes = np.stack([[s, c, z], [-np.sin(dec)*c, np.sin(dec)*s, z+np.cos(dec)]])/lam
    seen = np.einsum('akt,sk->ast', axes, xyz)
    return (seen[:, second]-seen[:, first]).reshape(2, -1)
def beam(uv, cell):
    at = np.rint(uv*(size*cell)).astype(np.intp)
    at = np.where(at[0] < 0, -at, at)
    half = size//2+1
    grid = np.bincount((at[1] % size)*half+at[0], minlength=size*half).reshape(size, half).astype(float)
    field = np.fft.fftshift(sf.irfft2(grid, s=(size, size)))
    return (field/field[size//2, size//2]).astype(np.float32)
cell = 1/np.hypot(*tracks()).max()/${FINE}
times = []
for turn in range(120):
    began = time.perf_counter(); beam(tracks(), cell); times.append(time.perf_counter()-began)
print(np.median(times[20:]))
`,
  ['numpy', 'scipy.fft'],
);

report({
  name: 'beam',
  unit: 'ms',
  n: u.length,
  seconds,
  peer: {
    peer:
      numpy === null
        ? 'numpy and scipy.fft by python3: not installed'
        : 'numpy tracks, nearest cells by bincount, scipy.fft.irfft2, by python3',
    seconds: numpy,
  },
  wanted: { atMost: 4, ratioAtLeast: 1.1 },
});
