import type { ReactNode } from 'react';
import { longTimeText, spanText } from '@/app/_ui/format';
import type { Viewer } from '@/src/access/policy';
import type { SessionHead } from '@/src/data/session/dto';
import { Masthead } from '../../../_masthead/masthead';

type Props = { viewer: Viewer; session: SessionHead; nowMs: number; children: ReactNode };

/** A page of a session: masthead with its name, one main part that fills the screen from desk width on. */
export function SessionFrame({ viewer, session, nowMs, children }: Props) {
  return (
    <div className="flex min-h-dvh flex-col desk:h-dvh">
      <Masthead
        viewer={viewer}
        nowMs={nowMs}
        place={{ kind: 'session', sessionId: session.code }}
        title={session.title}
        sub={headLine(session)}
      />
      <main id="main" className="flex min-h-0 flex-1 flex-col">
        {children}
      </main>
    </div>
  );
}

const headLine = ({ code, state, startMs, lengthSeconds }: SessionHead) =>
  `${code} · ${state} · ${spanText(lengthSeconds)} from ${longTimeText(startMs)}`;
