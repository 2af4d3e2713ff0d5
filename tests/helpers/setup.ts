import { afterEach, beforeEach, expect, vi } from 'vitest';

let spy: ReturnType<typeof vi.spyOn>;

beforeEach(() => {
  spy = vi.spyOn(console, 'error');
});

afterEach(() => {
  expect(spy, 'console.error fails a test').not.toHaveBeenCalled();
  spy.mockRestore();
});
