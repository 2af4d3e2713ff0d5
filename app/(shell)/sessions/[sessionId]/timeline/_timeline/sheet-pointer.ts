import type { PointerEvent as ReactPointerEvent } from 'react';
import { scanStopMs, type Scan } from '@/src/schedule/plan';
import { hitAt, type Hit } from './hit';
import { held } from './modifiers';
import { snapped, snappedLength } from './placement';
import { focusGrid, GRID_ID } from './places';
import { msAt, xOf, type Frame } from './scale';
import type { Placing } from './state';
import { useTimelineStore } from './store';
import { useDrop } from './use-drop';

const PICK_UP_PX = 4;

type Point = { x: number; y: number };

/** Choosing by click, moving and stretching by drag; a touch chooses, and moves by the buttons of the inspector. */
export function useSheetPointer(frame: Frame) {
  const store = useTimelineStore();
  const drop = useDrop();

  function onPointerDown(event: ReactPointerEvent<HTMLDivElement>) {
    if (event.button !== 0) return;
    store.setState({ placing: null });
    const sheet = event.currentTarget;
    const { plan, stations, canEdit } = store.getState();
    const at = pointIn(sheet, event);
    const hit = hitAt(frame, plan, stations, at.x, at.y);
    choose(hit, event.shiftKey);
    document.getElementById(GRID_ID)?.setAttribute('data-by', 'pointer');
    focusGrid();
    if (!hit || !canEdit || event.pointerType === 'touch') return;
    event.preventDefault();
    followDrag(sheet, hit, at);
  }

  function choose(hit: Hit | null, onlyStation: boolean) {
    if (hit) store.setState({ chosen: { scanId: hit.scan.id, station: onlyStation ? hit.station : null } });
    else store.setState({ chosen: null });
  }

  /** The drag is computed from the scan as it was at pick-up, never from the last frame. */
  function followDrag(sheet: HTMLElement, hit: Hit, from: { x: number; y: number }) {
    let isHeld = false;
    const { revs } = store.getState();
    const move = (event: PointerEvent) => {
      const at = pointIn(sheet, event);
      isHeld ||= Math.hypot(at.x - from.x, at.y - from.y) >= PICK_UP_PX;
      if (isHeld) store.setState({ placing: placingOf(hit, from, at, revs) });
    };
    const end = (event: PointerEvent) => {
      stop();
      if (event.type === 'pointercancel') store.setState({ placing: null });
      else if (isHeld) drop({ force: held.shift });
    };
    const escape = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return;
      event.stopPropagation();
      stop();
      store.setState({ placing: null });
    };
    const stop = () => {
      window.removeEventListener('pointermove', move);
      window.removeEventListener('pointerup', end);
      window.removeEventListener('pointercancel', end);
      window.removeEventListener('keydown', escape, true);
    };
    window.addEventListener('pointermove', move);
    window.addEventListener('pointerup', end);
    window.addEventListener('pointercancel', end);
    window.addEventListener('keydown', escape, true);
  }

  function placingOf(hit: Hit, from: Point, at: Point, revs: Placing['seenRevs']): Placing {
    const held0 = pickedUp(hit.scan, hit.part === 'stop' ? 'length' : 'move', at, revs);
    const state = store.getState();
    if (hit.part === 'stop') {
      const stopMs = scanStopMs(hit.scan) + msAt(frame, at.x) - msAt(frame, from.x);
      return snappedLength(state, frame, held.alt, held0, stopMs);
    }
    const isOut = at.y < 0 || at.y > frame.height;
    const startX = xOf(frame, hit.scan.startMs) + at.x - from.x;
    const placing = snapped(state, frame, held.alt, { ...held0, startMs: msAt(frame, startX) });
    return isOut && hit.station !== null
      ? { ...placing, startMs: hit.scan.startMs, outStation: hit.station }
      : placing;
  }

  /** The pointer shows what a press would take hold of. */
  function onPointerMove(event: ReactPointerEvent<HTMLDivElement>) {
    const { plan, stations, canEdit, placing } = store.getState();
    if (placing || event.buttons !== 0) return;
    const at = pointIn(event.currentTarget, event);
    const hit = hitAt(frame, plan, stations, at.x, at.y);
    event.currentTarget.style.cursor = !hit
      ? ''
      : !canEdit
        ? 'pointer'
        : hit.part === 'stop'
          ? 'ew-resize'
          : 'grab';
  }

  return { onPointerDown, onPointerMove };
}

export function pickedUp(
  scan: Scan,
  what: 'move' | 'length',
  pointer: Placing['pointer'],
  seenRevs: Placing['seenRevs'],
): Placing {
  return {
    by: pointer ? 'pointer' : 'keys',
    what,
    scanId: scan.id,
    sourceId: scan.sourceId,
    modeId: scan.modeId,
    startMs: scan.startMs,
    lengthSeconds: scan.lengthSeconds,
    stations: scan.stations,
    snappedTo: null,
    pointer,
    isCopy: what === 'move' && pointer !== null && held.copy,
    seenRevs,
    outStation: null,
  };
}

function pointIn(sheet: HTMLElement, event: { clientX: number; clientY: number }) {
  const box = sheet.getBoundingClientRect();
  return { x: event.clientX - box.left, y: event.clientY - box.top };
}
