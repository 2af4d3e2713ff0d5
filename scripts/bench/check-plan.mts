import { checkPlan } from '../../src/schedule/checks';
import { inventedPlan } from './invented-plan';
import { medianSeconds, report } from './measure';

const { plan, context } = inventedPlan(1000, 16);
const problems = checkPlan(plan, context).length;

/** The same plan as another one, so that nothing is remembered of its scans; sources and stations stay known. */
const anew = () => ({ ...plan, scans: plan.scans.map((scan) => ({ ...scan })) });

report({
  name: 'check-plan',
  unit: 'ms',
  n: plan.scans.length,
  seconds: medianSeconds(() => checkPlan(anew(), context).length),
  peer: { peer: `none: the whole check, which finds ${problems} problems`, seconds: null },
  wanted: { atMost: 15 },
});
