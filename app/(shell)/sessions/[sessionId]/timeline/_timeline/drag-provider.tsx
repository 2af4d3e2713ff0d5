'use client';

import {
  DndContext,
  DragOverlay,
  MouseSensor,
  TouchSensor,
  useSensor,
  useSensors,
  type DragMoveEvent,
  type Modifier,
} from '@dnd-kit/core';
import type { SkyTable } from '@/src/schedule/sky-table';
import { DEFAULT_LENGTH_SECONDS } from './key-placing';
import { held, useHeldKeys } from './modifiers';
import { snapped } from './placement';
import { sheetBox } from './places';
import { frameOf, msAt, type Frame } from './scale';
import type { Placing } from './state';
import { useTimeline, useTimelineStore } from './store';
import { useDrop } from './use-drop';

/** Dragging from the tray: the slip follows the pointer, the ghost stands where it would be dropped. */
export function DragProvider({ table, children }: { table: SkyTable | null; children: React.ReactNode }) {
  const store = useTimelineStore();
  const drop = useDrop();
  useHeldKeys();
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 4 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 350, tolerance: 8 } }),
  );
  const onDragMove = ({ active, activatorEvent, delta }: DragMoveEvent) => {
    const from = pointOf(activatorEvent);
    const box = sheetBox();
    if (!from || !box || !table) return;
    const { view, stations } = store.getState();
    const frame = frameOf(box.width, view, stations.length);
    const x = from.x + delta.x - box.left;
    const y = from.y + delta.y - box.top;
    const isOver = x >= frame.left && x <= frame.right && y >= 0 && y <= box.height;
    store.setState({ placing: isOver ? placingAt(String(active.id), x, y, frame) : null });
  };
  const placingAt = (sourceId: string, x: number, y: number, frame: Frame): Placing => {
    const { mode } = store.getState();
    return snapped(store.getState(), frame, held.alt, {
      by: 'pointer',
      what: 'new',
      scanId: null,
      sourceId,
      modeId: mode.id,
      startMs: msAt(frame, x),
      lengthSeconds: DEFAULT_LENGTH_SECONDS,
      stations: 'all-up',
      snappedTo: null,
      pointer: { x, y },
      isCopy: false,
      seenRevs: store.getState().revs,
      outStation: null,
    });
  };
  return (
    <DndContext
      id="tray"
      accessibility={{ announcements: SILENT, screenReaderInstructions: INSTRUCTIONS }}
      sensors={sensors}
      autoScroll={false}
      onDragStart={({ active }) => store.setState({ traySourceId: String(active.id), placing: null })}
      onDragMove={onDragMove}
      onDragCancel={() => store.setState({ placing: null })}
      onDragEnd={() => drop({ force: held.shift })}
    >
      {children}
      <DragOverlay dropAnimation={null} modifiers={[besidePointer]}>
        <Slip />
      </DragOverlay>
    </DndContext>
  );
}

function Slip() {
  const name = useTimeline((state) =>
    state.traySourceId === null ? null : state.context.sources[state.traySourceId]?.name,
  );
  return (
    <div className="relative inline-block cursor-grabbing whitespace-nowrap border-frame border-ink bg-sheet py-[3px] pl-[20px] pr-[9px] text-table font-head">
      <span aria-hidden="true" className="dots absolute left-[7px] top-[5px] h-[15px] w-1.5" />
      {name}
    </div>
  );
}

/** A drag by mouse is not spoken; move mode by keys has its own live sentence. */
const SILENT = {
  onDragStart: () => undefined,
  onDragOver: () => undefined,
  onDragEnd: () => undefined,
  onDragCancel: () => undefined,
};
const INSTRUCTIONS = { draggable: 'Press Enter to place it with the keys.' };

/** The slip hangs at the right of the pointer. */
const besidePointer: Modifier = ({ activatorEvent, activeNodeRect, transform }) => {
  const from = activatorEvent && pointOf(activatorEvent);
  if (!from || !activeNodeRect) return transform;
  return {
    ...transform,
    x: transform.x + from.x - activeNodeRect.left + 12,
    y: transform.y + from.y - activeNodeRect.top - 12,
  };
};

function pointOf(event: Event): { x: number; y: number } | null {
  if (event instanceof MouseEvent) return { x: event.clientX, y: event.clientY };
  if (typeof TouchEvent !== 'undefined' && event instanceof TouchEvent) {
    const [touch] = event.touches;
    return touch ? { x: touch.clientX, y: touch.clientY } : null;
  }
  return null;
}
