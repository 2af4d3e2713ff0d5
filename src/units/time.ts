/** Half-open span of UTC, [start, end). */
export type Interval = { start: Date; end: Date };
