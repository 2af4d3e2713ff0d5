import { FootnoteLetter } from '@/app/_ui/footnote-letter';
import type { Timeline } from '@/src/data/plan/dto';
import { checkPlan } from '@/src/schedule/checks';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { planContextOf } from '../_plan/plan-context';

/** How many problems of a plan must be fixed, or else are to be noted. */
export async function Problems({ reading }: { reading: Promise<Timeline | null> }) {
  const timeline = await reading;
  if (!timeline) return null;
  const plan = unpackPlan(timeline.plan);
  if (plan.scans.length === 0) return <span className="text-ink2">no scans yet</span>;
  const problems = checkPlan(plan, planContextOf(timeline));
  const toFix = problems.filter(({ severity }) => severity === 'fix').length;
  if (problems.length === 0) return <span className="text-ink2">none</span>;
  return (
    <span className="list-problems">
      {toFix > 0 && <FootnoteLetter mustFix />}
      {toFix > 0 ? `${toFix} to fix` : `${problems.length} to note`}
    </span>
  );
}
