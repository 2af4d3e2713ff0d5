export function bareBytes(): Promise<number>;
export function scriptsOf(html: string): string[];
export const gzipped: (file: string) => number;
