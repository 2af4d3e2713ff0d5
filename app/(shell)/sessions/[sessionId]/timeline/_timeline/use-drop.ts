import { showToast } from '@/app/_ui/toast';
import { addScan } from '@/src/schedule/gestures/add-scan';
import { changeLength } from '@/src/schedule/gestures/change-length';
import { moveScan } from '@/src/schedule/gestures/move-scan';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import type { Command } from '@/src/schedule/commands';
import type { ScanId } from '@/src/schedule/plan';
import { useActs } from './acts';
import { newId } from './ids';
import { judge } from './placement';
import type { Placing, TimelineState } from './state';
import { useTimelineStore } from './store';

type Way = { force: boolean; copy: boolean };

/** Drops what is held: one command, or a refusal that says why. */
export function useDrop(): (way: Way) => void {
  const store = useTimelineStore();
  const { dispatch, undo } = useActs();
  return ({ force, copy }) => {
    const state = store.getState();
    const { placing } = state;
    if (!placing) return;
    store.setState({ placing: null });
    if (placing.outStation !== null && placing.scanId !== null) {
      dispatch(toggleStation(state.plan, placing.scanId, placing.outStation));
      showToast({
        message: `${placing.outStation} was left out of the scan.`,
        action: { label: 'Undo', run: undo },
      });
      return;
    }
    if (placing.what !== 'new' && !copy && isWhereItWas(placing, state)) return;
    const judged = judge(placing, state.plan, state.context);
    if (judged.verdict === 'no' && !force) {
      showToast({ message: `Not dropped. ${judged.reason} Hold Shift to drop it all the same.` });
      return;
    }
    const { scanId, command } = commandOf(placing, state, copy);
    if (dispatch(command)) store.setState({ chosen: { scanId, station: null } });
  };
}

function commandOf(
  placing: Placing,
  { plan, context }: TimelineState,
  copy: boolean,
): { scanId: ScanId; command: Command } {
  const { scanId, sourceId, modeId, startMs, lengthSeconds, stations } = placing;
  if (scanId === null || copy) {
    const id = newId();
    const codes = stations === 'all-up' ? {} : { stations: stations.map(({ station }) => station) };
    return {
      scanId: id,
      command: addScan(plan, context, { id, sourceId, modeId, startMs, lengthSeconds, ...codes }),
    };
  }
  if (placing.what === 'length') return { scanId, command: changeLength(plan, scanId, lengthSeconds) };
  return { scanId, command: moveScan(plan, scanId, startMs) };
}

function isWhereItWas({ scanId, startMs, lengthSeconds }: Placing, { plan }: TimelineState): boolean {
  const scan = plan.scans.find(({ id }) => id === scanId);
  return scan?.startMs === startMs && scan.lengthSeconds === lengthSeconds;
}
