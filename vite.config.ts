import path from 'node:path';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

// `#client/*` and `#shared/*` need no alias: Vite reads the `imports` map of package.json.
export default defineConfig({
  root: path.resolve(import.meta.dirname, 'client'),
  plugins: [react(), tailwindcss()],
  build: {
    outDir: path.resolve(import.meta.dirname, 'dist/client'),
    emptyOutDir: true,
    manifest: true,
    target: 'es2023',
    sourcemap: true,
    // The chart library is one lazy chunk of about 560 kB; what counts is the initial script, held by its own test.
    chunkSizeWarningLimit: 700,
  },
  server: {
    host: '127.0.0.1',
    strictPort: true,
    proxy: { '/api': { target: process.env.API_ORIGIN ?? 'http://127.0.0.1:3001' } },
  },
});
