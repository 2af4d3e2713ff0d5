import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { baselineUvw } from '@/src/array/uvw';
import { gmstHours } from '@/src/sky/position';
import { geodeticToItrf } from '@/src/sky/site';
import { makeContext, MODE, SOURCES, STATIONS, withStation } from '../schedule/context-maker';
import { member, T0 } from '../schedule/plan-maker';
import { byHand, cellOf, planOf, withSource } from './hand';

const TOLERANCE = {
  /** closed forms written twice; what is left is rounding [4e-16] */
  relative: 1e-9,
  /** mean sidereal time and J2000 axes by hand: precession turns u, v by 0.15° and lengthens them by 0.3 % at most */
  roughUv: 0.02,
};

const off = (found: number | null, hand: number) => Math.abs((found ?? NaN) / hand - 1);

function withMode(changes: Partial<typeof MODE>) {
  return makeContext({ modes: { 'mode-a': { ...MODE, ...changes } } });
}

describe('the SNR of a point source', () => {
  it('is S √n_pol / σ, with two-bit efficiency', () => {
    const found = cellOf(planOf(), 'Af–Bm');
    const hand = byHand();
    expect(off(found.snr, hand.snr)).toBeLessThan(TOLERANCE.relative);
    expect(off(found.sigmaJy, hand.sigma)).toBeLessThan(TOLERANCE.relative);
    expect(found).toMatchObject({ overlapSeconds: 600, sefd1Jy: 800, sefd2Jy: 800, coherence: 1 });
    expect(off(found.correlatedFluxJy, 0.5)).toBeLessThan(TOLERANCE.relative);
  });

  it('keeps the SEFDs in the order of the baseline', () => {
    const found = cellOf(planOf(), 'Af–Bm', withStation('Bm', { sefdJy: { '8.4 GHz': 1500 } }));
    expect(found).toMatchObject({ sefd1Jy: 800, sefd2Jy: 1500 });
    expect(off(found.snr, byHand({ sefd2: 1500 }).snr)).toBeLessThan(TOLERANCE.relative);
  });

  it('takes the lesser bits of mode and station at each end', () => {
    const mixed = byHand({ eta: Math.sqrt((2 / Math.PI) * 0.8812) });
    const coarse = byHand({ eta: 2 / Math.PI });
    const oneBitStation = cellOf(planOf(), 'Af–Bm', withStation('Bm', { bits: 1 }));
    expect(off(oneBitStation.snr, mixed.snr)).toBeLessThan(TOLERANCE.relative);
    expect(off(cellOf(planOf(), 'Af–Bm', withMode({ bits: 1 })).snr, coarse.snr)).toBeLessThan(
      TOLERANCE.relative,
    );
  });

  it('takes one product of a single polarisation', () => {
    const found = cellOf(planOf(), 'Af–Bm', withMode({ polarisations: 1 }));
    expect(off(found.snr, byHand({ products: 1 }).snr)).toBeLessThan(TOLERANCE.relative);
  });

  it('counts the time that both are on source, late and early ones taken off', () => {
    const found = cellOf(planOf({ stations: [member('Af', 120, 0), member('Bm', 0, 180)] }), 'Af–Bm');
    expect(found.overlapSeconds).toBe(300);
    expect(off(found.snr, byHand({ seconds: 300 }).snr)).toBeLessThan(TOLERANCE.relative);
  });

  it('loses what the atmosphere takes', () => {
    const found = cellOf(planOf(), 'Af–Bm', withMode({ coherenceSeconds: 120 }));
    const hand = byHand({ coherenceSeconds: 120 });
    expect(off(found.coherence, hand.coherence)).toBeLessThan(TOLERANCE.relative);
    expect(off(found.snr, hand.snr)).toBeLessThan(TOLERANCE.relative);
  });

  it('never falls when a scan gets longer, whatever the coherence time', () => {
    const seconds = fc.integer({ min: 1, max: 20_000 });
    const coherence = fc.option(fc.integer({ min: 1, max: 5000 }), { nil: null });
    fc.assert(
      fc.property(seconds, seconds, coherence, (a, b, coherenceSeconds) => {
        const snrOf = (lengthSeconds: number) =>
          cellOf(planOf({ sourceId: 'src-b', lengthSeconds }), 'Af–Bm', withMode({ coherenceSeconds })).snr;
        const [shorter, longer] = [snrOf(Math.min(a, b)) ?? NaN, snrOf(Math.max(a, b)) ?? NaN];
        expect(longer).toBeGreaterThanOrEqual(shorter * (1 - 1e-12));
      }),
    );
  });
});

describe('a resolved source', () => {
  const fwhmRad = (0.6 / 3_600_000) * (Math.PI / 180);
  const [em, af, source] = [STATIONS['Em'], STATIONS['Af'], SOURCES['src-a']];
  if (!em || !af || !source) throw new Error('not in the catalogue');
  const [first, second] = [geodeticToItrf(em.site), geodeticToItrf(af.site)];
  const argumentOf = (u: number, v: number, skyHz = 8.415e9) =>
    ((Math.PI * fwhmRad * Math.hypot(u, v) * skyHz) / 299_792_458) ** 2 / (4 * Math.LN2);

  it('is projected at the middle of the overlap, in wavelengths of the mode', () => {
    const stations = [member('Af', 200, 0), member('Em', 0, 100)];
    const midMs = T0 + ((200 + 500) / 2) * 1000;
    const { u, v } = baselineUvw(first, second, source.position, new Date(midMs));
    const found = cellOf(planOf({ stations }), 'Em–Af', withSource({ fwhmRad }));
    const left = 0.5 * Math.exp(-argumentOf(u, v));
    expect(off(found.correlatedFluxJy, left)).toBeLessThan(TOLERANCE.relative);
    expect(off(found.snr, byHand({ flux: left, seconds: 300 }).snr)).toBeLessThan(TOLERANCE.relative);
    const lower = { ...withSource({ fwhmRad }), modes: { 'mode-a': { ...MODE, skyHz: 4e9 } } };
    const more = 0.5 * Math.exp(-argumentOf(u, v, 4e9));
    expect(off(cellOf(planOf({ stations }), 'Em–Af', lower).correlatedFluxJy, more)).toBeLessThan(
      TOLERANCE.relative,
    );
  });

  it('loses flux as a Gaussian does on the projected baseline (TMS eq. 4.1, done roughly by hand)', () => {
    const found = cellOf(planOf(), 'Em–Af', withSource({ fwhmRad }));
    const d = { x: second.x - first.x, y: second.y - first.y, z: second.z - first.z };
    const hour = ((gmstHours(new Date(T0 + 300_000)) * 15 - source.position.raDeg) * Math.PI) / 180;
    const dec = (source.position.decDeg * Math.PI) / 180;
    const u = Math.sin(hour) * d.x + Math.cos(hour) * d.y;
    const v =
      -Math.sin(dec) * Math.cos(hour) * d.x + Math.sin(dec) * Math.sin(hour) * d.y + Math.cos(dec) * d.z;
    const argument = argumentOf(u, v);
    expect(argument).toBeGreaterThan(0.3);
    expect(off(found.correlatedFluxJy, 0.5 * Math.exp(-argument))).toBeLessThan(TOLERANCE.roughUv * argument);
    expect(off(found.baselineM, Math.hypot(d.x, d.y, d.z))).toBeLessThan(TOLERANCE.relative);
  });
});

describe('what is missing', () => {
  it('is told as the SEFD of the station and the band, the rest is still worked out', () => {
    const found = cellOf(planOf(), 'Af–Bm', withStation('Bm', { sefdJy: { '22 GHz': 1000 } }));
    expect(found).toMatchObject({ verdict: 'unknown', reason: 'sefd', snr: null, sigmaJy: null });
    expect(found).toMatchObject({ sefd1Jy: 800, sefd2Jy: null, overlapSeconds: 600, coherence: 1 });
    expect(off(found.correlatedFluxJy, 0.5)).toBeLessThan(TOLERANCE.relative);
    expect(found.missing).toBe('SEFD of Bm at 8.4 GHz');
  });

  it('is told as the flux of the source', () => {
    const found = cellOf(planOf(), 'Af–Bm', withSource(null));
    expect(found).toMatchObject({ verdict: 'unknown', reason: 'flux', correlatedFluxJy: null, snr: null });
    expect(found.missing).toBe('flux of J0854+2006 at 8.4 GHz');
    expect(off(found.sigmaJy, byHand().sigma)).toBeLessThan(TOLERANCE.relative);
  });

  it('is told whole when several inputs are missing', () => {
    const band = { 'mode-a': { ...MODE, band: '43 GHz' } };
    expect(cellOf(planOf(), 'Af–Bm', makeContext({ modes: band }))).toMatchObject({
      reason: 'sefd',
      missing: 'SEFD of Af, SEFD of Bm and flux of J0854+2006 at 43 GHz',
    });
  });

  it('is told for a source that is not in the catalogue', () => {
    const found = cellOf(planOf({ sourceId: 'gone' }), 'Af–Bm');
    expect(found).toMatchObject({ verdict: 'unknown', reason: 'flux' });
    expect(found.missing).toBe('flux of a source not in the catalogue at 8.4 GHz');
  });
});
