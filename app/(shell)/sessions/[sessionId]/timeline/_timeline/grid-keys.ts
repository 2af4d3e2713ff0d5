import type { KeyboardEvent } from 'react';
import type { Plan, ScanId, StationCode } from '@/src/schedule/plan';
import { removeScan } from '@/src/schedule/gestures/remove-scan';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import { useActs } from './acts';
import { useDerivedStore } from './derived';
import { useKeyPlacing } from './key-placing';
import { INSPECTOR_ID } from './places';
import { inView } from './scans';
import { clampView, frameOf, HOUR, LEVELS } from './scale';
import type { TimelineState } from './state';
import { useTimelineStore } from './store';
import { focusOf } from './tool-bar';

/** Keys of the grid, in and out of move mode (DESIGN §8). They act only while the grid has the focus. */
export function useGridKeys() {
  const store = useTimelineStore();
  const derived = useDerivedStore();
  const acts = useActs();
  const placing = useKeyPlacing();

  function inMoveMode(event: KeyboardEvent): boolean {
    const direction = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (direction !== 0) {
      if (event.ctrlKey || event.metaKey) placing.toNextSnap(direction);
      else placing.nudge(direction * (event.shiftKey ? 60 : event.altKey ? 1 : 10));
    } else if (event.key === 'Enter') placing.drop(event.shiftKey);
    else if (event.key === 'Escape') placing.cancel();
    else return false;
    return true;
  }

  function step(columns: number, rows: number) {
    const state = store.getState();
    const { plan, chosen, stations } = state;
    if (plan.scans.length === 0) return;
    const at = plan.scans.findIndex(({ id }) => id === chosen?.scanId);
    const next = at < 0 ? firstSeen(state) : Math.max(0, Math.min(plan.scans.length - 1, at + columns));
    const row = chosen?.station ? 1 + stations.findIndex(({ code }) => code === chosen.station) : 0;
    const nextRow = at < 0 ? 0 : Math.max(0, Math.min(stations.length, row + rows));
    const scan = plan.scans[next];
    if (!scan) return;
    const station = nextRow === 0 ? null : (stations[nextRow - 1]?.code ?? null);
    store.setState({
      chosen: { scanId: scan.id, station },
      view: viewOf(state, scan.startMs, scan.lengthSeconds),
    });
  }

  function toProblem(direction: 1 | -1) {
    const state = store.getState();
    const problems = [...derived.getState().problems].sort((a, b) => a.atMs - b.atMs);
    if (problems.length === 0) return;
    const now = state.plan.scans.find(({ id }) => id === state.chosen?.scanId)?.startMs;
    const at = problems.findIndex(
      ({ scanId, station }) => scanId === state.chosen?.scanId && station === state.chosen?.station,
    );
    const next =
      at >= 0
        ? problems[(at + direction + problems.length) % problems.length]
        : direction === 1
          ? (problems.find(({ atMs }) => now === undefined || atMs >= now) ?? problems[0])
          : (problems.filter(({ atMs }) => now === undefined || atMs <= now).at(-1) ?? problems.at(-1));
    const scan = state.plan.scans.find(({ id }) => id === next?.scanId);
    if (!next || !scan) return;
    store.setState({
      chosen: { scanId: scan.id, station: next.station },
      view: viewOf(state, scan.startMs, scan.lengthSeconds),
    });
  }

  function zoom(by: 1 | -1 | 'all') {
    const { view, plan, chosen } = store.getState();
    const at = LEVELS.findIndex(({ hours }) => hours === view.hours);
    const level = by === 'all' ? LEVELS[0] : LEVELS[Math.max(0, Math.min(LEVELS.length - 1, at + by))];
    if (!level) return;
    const about = plan.scans.find(({ id }) => id === chosen?.scanId)?.startMs;
    const middle = about ?? view.startMs + (view.hours * HOUR) / 2;
    store.setState({
      view: clampView({ hours: level.hours, startMs: middle - (level.hours * HOUR) / 2 }, plan),
    });
  }

  function onScan(key: string): boolean {
    const { chosen, canEdit, placing: isHeld } = store.getState();
    if (!chosen || !canEdit || isHeld) return false;
    if (key === 'm') placing.startMove(chosen.scanId);
    else if (key === 'l') placing.startLength(chosen.scanId);
    else if (key === 'delete' || key === 'backspace')
      acts.dispatch((plan) => removeScan(plan, chosen.scanId));
    else if (key === ' ' && chosen.station !== null) acts.dispatch(toggleOf(chosen.scanId, chosen.station));
    else return false;
    return true;
  }

  function anywhere(key: string): boolean {
    const state = store.getState();
    switch (key) {
      case 'arrowleft':
        step(-1, 0);
        return true;
      case 'arrowright':
        step(1, 0);
        return true;
      case 'arrowup':
        step(0, -1);
        return true;
      case 'arrowdown':
        step(0, 1);
        return true;
      case '[':
        toProblem(-1);
        return true;
      case ']':
        toProblem(1);
        return true;
      case '+':
      case '=':
        zoom(1);
        return true;
      case '-':
        zoom(-1);
        return true;
      case '0':
        zoom('all');
        return true;
      case 'f':
        store.setState({ pinnedSourceId: state.pinnedSourceId === null ? focusOf(state) : null });
        return true;
      case 'n': {
        const sourceId = state.traySourceId ?? focusOf(state) ?? state.sources[0]?.id;
        if (sourceId !== undefined) placing.startNew(sourceId);
        return true;
      }
      case 'enter':
        document.getElementById(INSPECTOR_ID)?.focus();
        return state.chosen !== null;
      case 'escape':
        store.setState({ chosen: null });
        return true;
      default:
        return false;
    }
  }

  return (event: KeyboardEvent<HTMLElement>) => {
    if (!MODIFIERS.has(event.key)) event.currentTarget.removeAttribute('data-by');
    const isHandled =
      store.getState().placing?.by === 'keys'
        ? inMoveMode(event)
        : !event.ctrlKey &&
          !event.metaKey &&
          !event.altKey &&
          (onScan(event.key.toLowerCase()) || anywhere(event.key.toLowerCase()));
    if (isHandled) {
      event.preventDefault();
      event.stopPropagation();
    }
  };
}

const MODIFIERS = new Set(['Shift', 'Control', 'Alt', 'Meta']);

const toggleOf = (scanId: ScanId, station: StationCode) => (plan: Plan) =>
  toggleStation(plan, scanId, station);

/** The first scan in view: where the arrows begin. */
function firstSeen({ plan, view, stations }: TimelineState): number {
  const frame = frameOf(972, view, stations.length);
  const at = plan.scans.findIndex((scan) => inView(frame, scan));
  return Math.max(0, at);
}

function viewOf({ view, plan }: TimelineState, startMs: number, lengthSeconds: number) {
  const isSeen =
    startMs >= view.startMs && startMs + lengthSeconds * 1000 <= view.startMs + view.hours * HOUR;
  return isSeen ? view : clampView({ ...view, startMs: startMs - (view.hours * HOUR) / 3 }, plan);
}
