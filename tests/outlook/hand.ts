import { fringeOutlook, type OutlookCell, type OutlookContext } from '@/src/outlook/fringe-outlook';
import type { PlanSource } from '@/src/schedule/context';
import type { Plan, Scan } from '@/src/schedule/plan';
import { makeContext, SOURCES } from '../schedule/context-maker';
import { makePlan, makeScan, member } from '../schedule/plan-maker';

/** 2-bit sampling, SEFD 800 Jy at both ends, 2 × 32 MHz, two polarisations: as the maker's stations and mode. */
const USUAL = { sefd1: 800, sefd2: 800, eta: 0.8812, seconds: 600, flux: 0.5, products: 2 };

/** σ, coherence and SNR by the formulas (TMS ch. 6; coherence: common practice, no source), written again. */
export function byHand(changes: Partial<typeof USUAL> & { coherenceSeconds?: number } = {}) {
  const { sefd1, sefd2, eta, seconds, flux, products, coherenceSeconds } = { ...USUAL, ...changes };
  const sigma = Math.sqrt((sefd1 * sefd2) / (2 * 64e6 * seconds)) / eta;
  const x = coherenceSeconds ? seconds / coherenceSeconds : 0;
  const coherence = coherenceSeconds ? Math.sqrt((2 / x) * (1 - (1 - Math.exp(-x)) / x)) : 1;
  return { sigma, coherence, snr: (flux * coherence * Math.sqrt(products)) / sigma };
}

/** A plan of one scan with all four stations. */
export function planOf(changes: Partial<Scan> = {}): Plan {
  const stations = ['Af', 'Bm', 'Cf', 'Em'].map((code) => member(code));
  return makePlan([makeScan('a', { stations, ...changes })]);
}

/** The cell of a pair such as "Af–Bm". */
export function cellOf(plan: Plan, pair: string, context: OutlookContext = makeContext()): OutlookCell {
  const found = fringeOutlook(plan, context).find(({ first, second }) => `${first}–${second}` === pair);
  if (!found) throw new Error(`no cell ${pair}`);
  return found;
}

/** The maker's context with another flux density, size or lack of a model for src-a at 8.4 GHz. */
export function withSource(model: { fluxJy?: number; fwhmRad?: number } | null): OutlookContext {
  const source = SOURCES['src-a'];
  const component = source?.components['8.4 GHz']?.[0];
  if (!source || !component) throw new Error('no source');
  const { fluxJy = component.fluxJy, fwhmRad = 0 } = model ?? {};
  const components: PlanSource['components'] = model
    ? { '8.4 GHz': [{ ...component, fluxJy, majorRad: fwhmRad, minorRad: fwhmRad }] }
    : {};
  return makeContext({ sources: { ...SOURCES, 'src-a': { ...source, components } } });
}
