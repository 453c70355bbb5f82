import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      { test: { name: 'unit', include: ['tests/unit/**/*.test.ts'], environment: 'node' } },
      {
        oxc: { decorator: { legacy: true } },
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/postgres-global-setup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      {
        plugins: [react()],
        test: {
          name: 'client',
          include: ['tests/client/**/*.test.tsx', 'tests/client/**/*.test.ts'],
          environment: 'jsdom',
          setupFiles: ['tests/support/client-setup.ts'],
        },
      },
    ],
  },
});
