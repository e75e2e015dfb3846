import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react()],
  // The manifest is what the size check reads; plotly's chunk alone passes the usual warning size, and it is lazy.
  build: { target: 'es2023', sourcemap: false, manifest: true, chunkSizeWarningLimit: 1300 },
  worker: { format: 'es' },
  test: {
    include: ['test/**/*.test.ts', 'test/**/*.test.tsx'],
    exclude: ['test/bench/**'],
    setupFiles: ['test/support/warnings.ts', 'test/support/seed.ts'],
    testTimeout: 60_000,
    reporters: ['default', ['json', { outputFile: '.cache/vitest.json' }]],
  },
});
