type Placed = { code: string; site: { longitudeDeg: number } };

/** Eastward from the widest gap in longitude, so that neighbours on the Earth are neighbours on the sheet. */
export function staveOrder<T extends Placed>(stations: readonly T[]): T[] {
  const sorted = [...stations].sort(
    (a, b) => a.site.longitudeDeg - b.site.longitudeDeg || (a.code < b.code ? -1 : 1),
  );
  let [first, widest] = [0, -1];
  sorted.forEach((station, index) => {
    const west = sorted.at(index - 1) ?? station;
    const gap = (station.site.longitudeDeg - west.site.longitudeDeg + 720) % 360;
    if (gap > widest) [widest, first] = [gap, index];
  });
  return [...sorted.slice(first), ...sorted.slice(0, first)];
}
