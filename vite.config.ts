import react from '@vitejs/plugin-react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'build/client', emptyOutDir: true, target: 'es2023', manifest: true },
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    exclude: ['tests/journeys/**', 'tests/bench/**', 'node_modules/**'],
    environment: 'node',
    globalSetup: ['tests/support/global-setup.ts'],
    // Rooms are opened whole: on a busy machine that takes longer than the usual five seconds.
    testTimeout: 20_000,
    restoreMocks: true,
  },
});
