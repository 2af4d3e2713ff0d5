import { hideToast, showToast } from '@/app/_ui/toast';
import { addScan } from '@/src/schedule/gestures/add-scan';
import { changeLength } from '@/src/schedule/gestures/change-length';
import { moveScan } from '@/src/schedule/gestures/move-scan';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import type { PlanContext } from '@/src/schedule/context';
import type { ScanId } from '@/src/schedule/plan';
import { useActs } from './acts';
import { newId } from '@/app/_ui/new-id';
import { judge } from './placement';
import type { Doing } from './sender';
import type { Placing, TimelineState } from './state';
import { useTimelineStore } from './store';

type Way = { force: boolean };

/** Drops what is held: one command, or a refusal that says why. */
export function useDrop(): (way: Way) => void {
  const store = useTimelineStore();
  const { dispatch, undo } = useActs();
  return ({ force }) => {
    const state = store.getState();
    const { placing } = state;
    if (!placing) return;
    store.setState({ placing: null });
    if (placing.outStation !== null && placing.scanId !== null) {
      const { scanId, outStation } = placing;
      const isDone = dispatch((plan) => toggleStation(plan, scanId, outStation), placing.seenRevs);
      if (isDone) {
        const message = `${outStation} was left out of the scan.`;
        showToast({ message, action: { label: 'Undo', run: undo } });
      }
      return;
    }
    if (placing.what !== 'new' && !placing.isCopy && isWhereItWas(placing, state)) return;
    const judged = judge(placing, state.plan, state.context);
    const isHopeless = placing.what === 'new' && judged.can.length === 0;
    if (isHopeless || (judged.verdict === 'no' && !force)) {
      if (placing.by === 'keys') store.setState({ placing });
      const more = isHopeless
        ? ''
        : placing.by === 'keys'
          ? ' Shift Enter drops it all the same.'
          : ' Hold Shift to drop it all the same.';
      showToast({ message: `Not dropped. ${judged.reason}${more}` });
      return;
    }
    hideToast();
    const { scanId, doing } = doingOf(placing, state.context);
    if (dispatch(doing, placing.seenRevs)) store.setState({ chosen: { scanId, station: null } });
  };
}

function doingOf(placing: Placing, context: PlanContext): { scanId: ScanId; doing: Doing } {
  const { scanId, isCopy, sourceId, modeId, startMs, lengthSeconds, stations } = placing;
  if (scanId === null || isCopy) {
    const id = newId();
    const members = stations === 'all-up' ? {} : { stations };
    return {
      scanId: id,
      doing: (plan) => addScan(plan, context, { id, sourceId, modeId, startMs, lengthSeconds, ...members }),
    };
  }
  if (placing.what === 'length')
    return { scanId, doing: (plan) => changeLength(plan, scanId, lengthSeconds) };
  return { scanId, doing: (plan) => moveScan(plan, scanId, startMs) };
}

function isWhereItWas({ scanId, startMs, lengthSeconds }: Placing, { plan }: TimelineState): boolean {
  const scan = plan.scans.find(({ id }) => id === scanId);
  return scan?.startMs === startMs && scan.lengthSeconds === lengthSeconds;
}
