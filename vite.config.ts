import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react()],
  build: { target: 'es2023', sourcemap: false, chunkSizeWarningLimit: 1300 },
  worker: { format: 'es' },
  test: { include: ['test/**/*.test.ts', 'test/**/*.test.tsx'], exclude: ['test/bench/**'], testTimeout: 60_000 },
});
