'use server';

import type { Failure } from '@/src/data/errors';
import { readSky } from '@/src/data/sky/read';
import type { SkyTable } from '@/src/schedule/sky-table';
import { currentViewer } from '@/src/viewer/current-viewer';

/** Elevations and common windows, on load and when the span, stations or sources change. */
export async function computeSky(sessionId: string): Promise<{ ok: true; table: SkyTable } | Failure> {
  const viewer = await currentViewer();
  if (!viewer) {
    return {
      ok: false,
      code: 'unauthenticated',
      message: 'The login has ended. Sign in and open the timeline again.',
    };
  }
  return readSky(viewer, sessionId);
}
