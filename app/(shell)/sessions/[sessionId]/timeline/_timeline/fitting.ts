type Label = { id: string; middle: number; half: number; isKept?: boolean };

/** Labels, from left to right, that do not touch the one before; one that must be kept stands anyway. */
export function fittingLabels(labels: readonly Label[]): Set<string> {
  const fitting = new Set<string>();
  let right = -Infinity;
  for (const { id, middle, half, isKept } of labels) {
    if (!isKept && middle - half < right) continue;
    fitting.add(id);
    right = middle + half;
  }
  return fitting;
}
