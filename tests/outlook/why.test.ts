import { describe, expect, it } from 'vitest';
import type { OutlookCell } from '@/src/outlook/fringe-outlook';
import { verdictWords, whySentences } from '@/src/outlook/why';
import type { Scan } from '@/src/schedule/plan';
import { makeContext, MODE, withStation } from '../schedule/context-maker';
import { cellOf, planOf, withSource } from './hand';

const limits = { doubtful: 7, fair: 10, strong: 20 };

const cell: OutlookCell = {
  scanId: 's',
  first: 'Em',
  second: 'Cf',
  verdict: 'none',
  reason: 'snr',
  missing: null,
  overlapSeconds: 720,
  snr: 5.08,
  sefd1Jy: 800,
  sefd2Jy: 800,
  correlatedFluxJy: 0.05,
  baselineM: 11_838_000,
  sigmaJy: 0.01,
  coherence: 0.5,
};

const scan: Scan = {
  id: 's',
  sourceId: 'src-a',
  modeId: 'mode-a',
  startMs: Date.UTC(2027, 1, 13, 0, 46),
  lengthSeconds: 720,
  stations: ['Cf', 'Em'].map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 })),
  groupId: null,
  leg: null,
  comment: '',
};

describe('the verdict in words', () => {
  it('says how far a figure is short of the limit, from the figure shown', () => {
    expect(verdictWords(cell, limits)).toEqual({
      head: 'None expected: SNR 5.0',
      detail: 'Short of the limit of 7.0 by 2.0.',
    });
  });

  it('names what a doubtful one lacks to fair', () => {
    expect(verdictWords({ ...cell, verdict: 'doubtful', reason: null, snr: 8.47 }, limits)).toEqual({
      head: 'Doubtful: SNR 8.4',
      detail: 'Over the limit of 7.0, short of fair (10) by 1.6.',
    });
  });

  it('names the input that is missing', () => {
    const unknown = { ...cell, verdict: 'unknown', snr: null, missing: 'SEFD of Cf at 8.4 GHz' } as const;
    expect(verdictWords(unknown, limits).detail).toBe('What is missing: SEFD of Cf at 8.4 GHz.');
  });
});

describe('why a baseline has its verdict', () => {
  it('tells a resolved source first, then the coarser recorder', () => {
    const context = withStation('Cf', { bits: 1 });
    expect(whySentences(cell, scan, context)).toEqual([
      'The baseline of 11\u2009838 km resolves the source: 0.05 Jy of 0.50 Jy is left.',
      'Cf records 1 bit.',
    ]);
  });

  it('tells the time that counts where the air limits it: 720 s at an amplitude of 0.5 count as 180 s', () => {
    const context = makeContext({ modes: { 'mode-a': { ...MODE, coherenceSeconds: 120 } } });
    expect(whySentences({ ...cell, correlatedFluxJy: 0.48 }, scan, context)).toEqual([
      'On the baseline of 11\u2009838 km the source is nearly whole: 0.48 Jy of 0.50 Jy is left.',
      'At a coherence of 120 s, 12 min 00 s count as 3 min 00 s.',
    ]);
  });

  it('names who is left out', () => {
    const out = { ...cell, verdict: 'not-on', reason: 'out', second: 'Af' } as const;
    expect(whySentences(out, scan, makeContext())).toEqual(['Af is left out of the scan.']);
  });

  it('names who does not see the source', () => {
    const low = { ...cell, verdict: 'not-on', reason: 'low', second: 'Bm' } as const;
    // J0854+2006 transits the meridian of 12° E near this time, so it is far below the horizon 12 h later
    const half = { ...scan, startMs: scan.startMs + 12 * 3_600_000 };
    expect(whySentences({ ...low, first: 'Af' }, half, makeContext())).toEqual([
      'The source is below the limits of Af and Bm during the scan.',
    ]);
  });

  it.each([
    ['doubtful', 'edge', 'Doubtful: the clock', 'not known well enough'],
    ['none', 'outside', 'None expected: the clock', 'beyond the window'],
    ['unknown', 'unknown', 'No data', 'There is no clock reading of Bm.'],
  ] as const)('names the clock where it limits: %s', (verdict, place, head, words) => {
    const context = {
      ...withSource({ fluxJy: 5 }),
      judgeClock: () => ({ place, amplitude: 1, missing: 'no clock reading of Bm' }),
    };
    const plan = planOf();
    const cell = cellOf(plan, 'Af–Bm', context);
    expect(cell.verdict).toBe(verdict);
    expect(verdictWords(cell, context.settings.snrLimits).head).toBe(head);
    const [scan] = plan.scans;
    if (!scan) throw new Error('no scan');
    expect(whySentences(cell, scan, context).join(' ')).toContain(words);
  });
});
