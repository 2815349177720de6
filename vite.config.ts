import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const needsDatabase = { environment: 'node' as const, testTimeout: 30_000, hookTimeout: 60_000 };

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist', emptyOutDir: true, chunkSizeWarningLimit: 700 },
  server: {
    proxy: {
      '/api': { target: `http://127.0.0.1:${process.env.API_PORT ?? 4311}` },
      '/socket.io': { target: `http://127.0.0.1:${process.env.API_PORT ?? 4311}`, ws: true },
    },
  },
  test: {
    projects: [
      {
        extends: true,
        // Nothing here changes the world, so files share their workers: a third of the time went into loading alone.
        test: { name: 'unit', include: ['tests/unit/**/*.test.ts'], environment: 'node', isolate: false },
      },
      {
        extends: true,
        test: { name: 'outside', include: ['tests/outside/**/*.test.ts'], environment: 'node', testTimeout: 60_000 },
      },
      { extends: true, test: { name: 'ui', include: ['tests/ui/**/*.test.tsx'], environment: 'jsdom' } },
      ...['api', 'live', 'security'].map((name) => ({
        extends: true as const,
        test: {
          name,
          include: [`tests/${name}/**/*.test.ts`],
          globalSetup: ['tests/support/database.global.ts'],
          ...needsDatabase,
        },
      })),
      {
        extends: true,
        test: {
          name: 'faults',
          include: ['tests/faults/**/*.test.ts'],
          globalSetup: ['tests/support/database.global.ts'],
          ...needsDatabase,
          // These start whole servers and time them, so nothing else runs beside them.
          fileParallelism: false,
          sequence: { groupOrder: 1 },
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/support/database.global.ts'],
          ...needsDatabase,
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
          sequence: { groupOrder: 2 },
        },
      },
    ],
  },
});
