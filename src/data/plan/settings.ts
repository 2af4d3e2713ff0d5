import 'server-only';
import type { sessions } from '../../../db/schema/sessions';
import type { PlanSettings } from '../../schedule/context';

/** What the checks and the outlook take from a session's row. */
export function settingsOf(session: typeof sessions.$inferSelect): PlanSettings {
  return {
    minElevationDeg: session.minElevationDeg,
    leastSpareSeconds: session.leastSpareSeconds,
    snrLimits: { doubtful: session.snrDoubtful, fair: session.snrFair, strong: session.snrStrong },
    clockRules: {
      noteAfterHours: session.clockNoteHours,
      unknownAfterDays: session.clockUnknownDays,
      instrumentSigmaSeconds: session.instrumentSigmaSeconds,
    },
  };
}
