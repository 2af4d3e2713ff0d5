'use client';

import type { PlanContext } from '@/src/schedule/context';
import { outlookCsv } from './csv';
import type { Row } from './model';

export function ExportButton({
  rows,
  context,
  code,
}: {
  rows: readonly Row[];
  context: PlanContext;
  code: string;
}) {
  const save = () => {
    const url = URL.createObjectURL(new Blob([outlookCsv(rows, context)], { type: 'text/csv' }));
    const link = document.createElement('a');
    link.href = url;
    link.download = `${code}-fringes.csv`;
    link.click();
    URL.revokeObjectURL(url);
  };
  return (
    <button
      type="button"
      className="btn"
      aria-disabled={rows.length === 0}
      onClick={rows.length === 0 ? undefined : save}
    >
      Export table
    </button>
  );
}
