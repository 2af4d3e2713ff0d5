export const WIDTH = 848;
export const LEFT = 56;
export const FIRST = 206;
export const PITCH = 84;
export const HEIGHT = 62;

export type Across = (ms: number) => number;

export const heightOf = (elevationDeg: number) => HEIGHT * (1 - elevationDeg / 90);
