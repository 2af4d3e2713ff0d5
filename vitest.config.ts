import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;

export default defineConfig({
  resolve: {
    alias: [
      { find: 'server-only', replacement: path.join(root, 'tests/helpers/empty.ts') },
      { find: /^@\//, replacement: `${root}/` },
    ],
  },
  test: {
    include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
    setupFiles: ['tests/helpers/setup.ts'],
    // a machine may be busy with other work: slow is not wrong
    testTimeout: 180_000,
    hookTimeout: 180_000,
  },
});
