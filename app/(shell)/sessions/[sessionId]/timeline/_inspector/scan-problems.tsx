'use client';

import { ProblemText } from '../_timeline/footnotes';
import { useDerived } from '../_timeline/derived';
import type { ScanId } from '@/src/schedule/plan';

/** The problems of one scan, with their letters. */
export function ScanProblems({ scanId }: { scanId: ScanId }) {
  const problems = useDerived((derived) => derived.problems);
  const mine = problems.filter((problem) => problem.scanId === scanId);
  if (mine.length === 0) return null;
  return (
    <ul className="flex flex-col gap-1.5 text-table">
      {mine.map((problem) => (
        <li key={problem.key}>
          <ProblemText problem={problem} />
        </li>
      ))}
    </ul>
  );
}
