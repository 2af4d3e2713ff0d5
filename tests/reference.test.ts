import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

type Standing = { tested: string[] } | { dueLater: string };

/** Every file of known answers: who reads it, or why nobody does yet. */
const STANDING: Record<string, Standing> = {
  'allan.json': { dueLater: 'stability of clocks comes with the clock log' },
  'azel.json': { tested: ['sky/position.test.ts'] },
  'beam.json': { tested: ['array/beam.test.ts', 'array/beam-shape.test.ts'] },
  'closure.json': { dueLater: 'fringe residuals come with the correlator’s results' },
  'common.json': { tested: ['sky/overlap.test.ts'] },
  'delay.json': { tested: ['array/delay.test.ts'] },
  'geodetic.json': { tested: ['sky/site.test.ts'] },
  'parallactic.json': { tested: ['sky/position.test.ts'] },
  'regression.json': { tested: ['clock/fit.test.ts'] },
  'sensitivity.json': { tested: ['array/sensitivity.test.ts', 'array/structure.test.ts'] },
  'sidereal.json': { tested: ['sky/position.test.ts'] },
  'slew.json': { tested: ['sky/slew.test.ts'] },
  'sources.json': { tested: ['sky/track.test.ts'] },
  'sunmoon.json': { tested: ['sky/position.test.ts'] },
  'uvw.json': { tested: ['array/uvw.test.ts'] },
  'windows.json': { tested: ['sky/windows.test.ts'] },
};

const folder = import.meta.dirname;
const present = readdirSync(path.join(folder, 'reference')).sort();

describe('the known answers', () => {
  it('are all spoken for, and no file that is spoken for is missing', () => {
    expect(Object.keys(STANDING).sort()).toEqual(present);
  });

  it.each(Object.entries(STANDING))(
    '%s is read where the table says so, or says why not',
    (file, standing) => {
      if ('dueLater' in standing) {
        expect(standing.dueLater).toMatch(/\w+ .*come/);
        return;
      }
      expect(standing.tested.length).toBeGreaterThan(0);
      for (const test of standing.tested) {
        const full = path.join(folder, test);
        expect(existsSync(full), test).toBe(true);
        expect(readFileSync(full, 'utf8'), test).toMatch(
          new RegExp(`import \\w+ from '[./]+reference/${file}'`),
        );
      }
    },
  );

  it('carry their provenance', () => {
    for (const file of present) {
      const parsed: unknown = JSON.parse(readFileSync(path.join(folder, 'reference', file), 'utf8'));
      expect(parsed, file).toMatchObject({
        provenance: { source: expect.any(String), library: expect.any(String), units: expect.any(String) },
      });
    }
  });
});
