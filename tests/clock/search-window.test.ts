import { describe, expect, it } from 'vitest';
import { delayWindowSeconds, rateWindow, windowAmplitude } from '@/src/clock/search-window';

describe('the search window', () => {
  it('is 2 µs wide to each side at 16 MHz and 64 channels', () => {
    expect(delayWindowSeconds(64, 16e6)).toBeCloseTo(2e-6, 15);
  });

  it('is 5·10⁻¹¹ to each side at 2 s and 5 GHz', () => {
    expect(rateWindow(2, 5e9)).toBeCloseTo(5e-11, 20);
  });

  it('leaves 0.90 of the amplitude at half and 0.64 at the edge', () => {
    expect(windowAmplitude(0, 0)).toBe(1);
    expect(windowAmplitude(0.5, 0)).toBeCloseTo(Math.sin(Math.PI / 4) / (Math.PI / 4), 12);
    expect(windowAmplitude(0.5, 0)).toBeCloseTo(0.9, 2);
    expect(windowAmplitude(1, 0)).toBeCloseTo(2 / Math.PI, 12);
    expect(windowAmplitude(-1, 1)).toBeCloseTo((2 / Math.PI) ** 2, 12);
  });

  it('is refused without channels', () => {
    expect(() => delayWindowSeconds(0, 1e6)).toThrow(RangeError);
    expect(() => rateWindow(2, 0)).toThrow(RangeError);
  });
});
