/** Keys of what changes behind the viewer's back: each is the address it is read from. */
export const liveKeys = {
  network: '/api/stamp',
  desk: (stationCode: string) => `/api/stations/${stationCode}/desk` as const,
  stamp: (sessionId: string) => `/api/sessions/${sessionId}/stamp` as const,
  stationsStamp: (sessionId: string) => `/api/sessions/${sessionId}/stamp?of=stations` as const,
  nearby: (sessionId: string, sourceId: string, withinDeg: number) =>
    `/api/sessions/${sessionId}/nearby?source=${sourceId}&within=${withinDeg}` as const,
  clockStamp: (stationCode: string) => `/api/stations/${stationCode}/clock-stamp` as const,
  journal: (sessionId: string) => `/api/sessions/${sessionId}/journal` as const,
};
