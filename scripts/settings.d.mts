export const root: string;
export const nextBin: string;
export function isDemo(): boolean;
export function stop(sentence: string): never;
export const say: (text: string) => void;
