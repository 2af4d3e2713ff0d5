export function startMailFake(port?: number): Promise<string>;
