import type { ReactNode } from 'react';
import { RuledStaves } from './ruled-staves';

type EmptySheetProps = {
  heading: string;
  /** why, in a sentence */
  children: ReactNode;
  /** the way on: buttons and links, the first one primary */
  actions?: ReactNode;
  codes?: readonly string[];
  /** only where the server could not go on */
  isBroken?: boolean;
  level?: 1 | 2;
};

/** What stands where there is nothing to show: the ruled sheet and one box. */
export function EmptySheet({
  heading,
  children,
  actions,
  codes,
  isBroken = false,
  level = 1,
}: EmptySheetProps) {
  const Heading = level === 1 ? 'h1' : 'h2';
  return (
    <div className="empty-sheet">
      <RuledStaves codes={codes} />
      <div className={isBroken ? 'empty-box empty-box-broken' : 'empty-box'}>
        <Heading>{heading}</Heading>
        <div className="empty-words">{children}</div>
        {actions !== undefined && <div className="empty-actions">{actions}</div>}
      </div>
    </div>
  );
}
