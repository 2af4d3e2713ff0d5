import type { PlanSettings, PlanSource, PlanStation } from '../schedule/context';
import { trackNear } from '../schedule/sight';
import { skyStation } from '../schedule/sky-station';
import type { SiteFrame } from '../sky/site';
import { prepareSite, trackElevationDeg, trackHourAngleDeg, type Track } from '../sky/track';
import { windowsBySearch } from '../sky/windows-by-search';
import { normalise360 } from '../units/angle';
import { SIDEREAL_DAY_SECONDS } from '../units/constants';

const MS_PER_HOUR_ANGLE_DEG = (SIDEREAL_DAY_SECONDS * 1000) / 360;

/**
 * Whether a station sees a source all the time from start to stop, above its mask and within its limits.
 *
 * @param settings  minElevationDeg holds on top of the station's own limit
 * @param startMs   epoch ms, UTC; less than stopMs, by a day at most
 * @returns limits as `skyStation`, inclusive
 *
 * Error   as `windowsBySearch` (tests/outlook/in-view.test.ts); a few µs where no mask comes near
 * Source  elevation is lowest and highest at an end or a culmination; near a mask, or where the mount has limits of its
 *         own, `windowsBySearch` decides
 */
export function isInView(
  station: PlanStation,
  source: PlanSource,
  settings: Pick<PlanSettings, 'minElevationDeg'>,
  startMs: number,
  stopMs: number,
): boolean {
  const limits = skyStation(station, settings);
  const track = trackNear(source, startMs);
  const { lowestDeg, highestDeg } = elevationRange(track, prepareSite(station.site), startMs, stopMs);
  if (lowestDeg < limits.minElevationDeg || highestDeg > (limits.maxElevationDeg ?? 90)) return false;
  const isClear = station.horizon.every(({ elevationDeg }) => elevationDeg <= lowestDeg);
  if (isClear && reachesAllRound(station)) return true;
  const span = { start: new Date(startMs), end: new Date(stopMs) };
  const windows = windowsBySearch(track, limits, span);
  return windows.some(({ start, end }) => start.getTime() <= startMs && end.getTime() >= stopMs);
}

/** An az–el mount whose cable goes round: its elevations are all that limits it. */
function reachesAllRound({ mount }: PlanStation): boolean {
  return mount.kind === 'az-el' && mount.azimuth.maxDeg - mount.azimuth.minDeg >= 360;
}

function elevationRange(track: Track, site: SiteFrame, startMs: number, stopMs: number) {
  const hourAngleDeg = trackHourAngleDeg(track, site, startMs);
  const upperMs = startMs + normalise360(-hourAngleDeg) * MS_PER_HOUR_ANGLE_DEG;
  const lowerMs = startMs + normalise360(180 - hourAngleDeg) * MS_PER_HOUR_ANGLE_DEG;
  const turns = [upperMs, lowerMs].filter((ms) => ms < stopMs);
  const elevations = [startMs, stopMs, ...turns].map((ms) => trackElevationDeg(track, site, ms));
  return { lowestDeg: Math.min(...elevations), highestDeg: Math.max(...elevations) };
}
