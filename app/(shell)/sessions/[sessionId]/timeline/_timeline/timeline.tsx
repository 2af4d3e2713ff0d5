'use client';

import { lazy, Suspense, useEffect, useState } from 'react';
import { liveKeys } from '@/app/_ui/live-keys';
import type { Timeline as TimelineDto } from '@/src/data/plan/dto';
import { Inspector } from '../_inspector/inspector';
import { ActsProvider } from './acts';
import { createDerivedStore, DerivedProvider } from './derived';
import { DragProvider } from './drag-provider';
import { KeyPlacingProvider } from './key-placing';
import { Middle } from './middle';
import { createSender, type Sender } from './sender';
import { createTimelineStore, stationsWord, TimelineProvider, useTimeline, useTimelineStore } from './store';
import { ToolBar } from './tool-bar';
import { Tray } from './tray';
import { useSky } from './use-sky';

/** known: the stamp of the stations' word that the timeline was read after */
type Props = { timeline: TimelineDto; known: string | undefined; chosenScanId: string | null };

/** The sheet of a session: tool bar, tray, staves, notes, inspector. */
export function Timeline({ timeline, known, chosenScanId }: Props) {
  const [store] = useState(() => createTimelineStore(timeline, chosenScanId));
  const [sender] = useState(() => createSender(store));
  const [acts] = useState(() => ({
    dispatch: sender.dispatch,
    undo: () => sender.step('undo'),
    redo: () => sender.step('redo'),
  }));
  useEffect(() => store.setState(stationsWord(timeline)), [store, timeline]);
  useEffect(() => {
    void sender.catchUp();
    const onReturn = () => {
      sender.resume();
      if (document.visibilityState === 'visible') void sender.catchUp();
    };
    const onUndoKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z' || isTyping(event.target))
        return;
      event.preventDefault();
      if (store.getState().canEdit) sender.step(event.shiftKey ? 'redo' : 'undo');
    };
    const onLeave = (event: BeforeUnloadEvent) => {
      if (store.getState().pending.length > 0) event.preventDefault();
    };
    window.addEventListener('online', onReturn);
    document.addEventListener('visibilitychange', onReturn);
    window.addEventListener('beforeunload', onLeave);
    window.addEventListener('keydown', onUndoKey);
    return () => {
      window.removeEventListener('online', onReturn);
      document.removeEventListener('visibilitychange', onReturn);
      window.removeEventListener('beforeunload', onLeave);
      window.removeEventListener('keydown', onUndoKey);
    };
  }, [sender, store]);
  return (
    <TimelineProvider value={store}>
      <ActsProvider value={acts}>
        <WithDerived>
          <Frame />
          <LiveWhenReady sender={sender} known={known} />
        </WithDerived>
      </ActsProvider>
    </TimelineProvider>
  );
}

const Live = lazy(() => import('./live'));
const RefreshOn = lazy(() => import('@/app/_ui/refresh-on'));

const LIVE_AFTER_MS = 2000;

/** Loaded when the sheet has long been drawn: the first catch-up is made without it. */
function LiveWhenReady({ sender, known }: { sender: Sender; known: string | undefined }) {
  const sessionId = useTimeline((state) => state.session.id);
  const [isDue, setIsDue] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setIsDue(true), LIVE_AFTER_MS);
    return () => clearTimeout(timer);
  }, []);
  if (!isDue) return null;
  return (
    <Suspense>
      <Live sessionId={sessionId} sender={sender} />
      <RefreshOn address={liveKeys.stationsStamp(sessionId)} known={known} />
    </Suspense>
  );
}

function WithDerived({ children }: { children: React.ReactNode }) {
  const store = useTimelineStore();
  const [derived] = useState(() => createDerivedStore(store));
  useEffect(() => derived.start(), [derived]);
  return <DerivedProvider value={derived}>{children}</DerivedProvider>;
}

function Frame() {
  const { table, problem, again } = useSky();
  return (
    <KeyPlacingProvider table={table}>
      <DragProvider table={table}>
        <ToolBar />
        <div className="grid min-h-0 flex-1 desk:grid-cols-[176px_minmax(0,1fr)_292px] desk:overflow-hidden">
          <Tray table={table} />
          <Middle table={table} problem={problem} again={again} />
          <Inspector />
        </div>
      </DragProvider>
    </KeyPlacingProvider>
  );
}

const isTyping = (target: EventTarget | null) =>
  target instanceof HTMLElement &&
  (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
