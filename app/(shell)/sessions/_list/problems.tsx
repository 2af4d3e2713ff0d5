import { FootnoteLetter } from '@/app/_ui/footnote-letter';
import type { Viewer } from '@/src/access/policy';
import { readTimeline } from '@/src/data/plan/read';
import { checkPlan } from '@/src/schedule/checks';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { planContextOf } from '../_plan/plan-context';

/** How many problems of a plan must be fixed, and how many are to be noted. */
export async function Problems({ viewer, code }: { viewer: Viewer; code: string }) {
  const answer = await readTimeline(viewer, code);
  if (!answer.ok) return null;
  const plan = unpackPlan(answer.timeline.plan);
  if (plan.scans.length === 0) return <span className="text-ink2">no scans yet</span>;
  const problems = checkPlan(plan, planContextOf(answer.timeline));
  const toFix = problems.filter(({ severity }) => severity === 'fix').length;
  if (problems.length === 0) return <span className="text-ink2">none</span>;
  return (
    <span className="list-problems">
      {toFix > 0 && <FootnoteLetter mustFix />}
      {toFix > 0 ? `${toFix} to fix` : `${problems.length} to note`}
    </span>
  );
}
