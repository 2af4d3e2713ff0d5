import { checkPlan } from '../../src/schedule/checks';
import { inventedPlan } from './invented-plan';
import { medianSeconds, report } from './measure';

const { plan, context } = inventedPlan(1000, 16);
const problems = checkPlan(plan, context).length;

report({
  name: 'check-plan',
  unit: 'ms',
  n: plan.scans.length,
  seconds: medianSeconds(() => checkPlan(plan, context).length),
  peer: { peer: `none: the whole check, which finds ${problems} problems`, seconds: null },
  wanted: { atMost: 15 },
});
