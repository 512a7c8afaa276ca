import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const apiTarget = `http://127.0.0.1:${process.env.PORT ?? '4180'}`;

export default defineConfig({
  plugins: [react()],
  server: { port: 5180, proxy: { '/api': apiTarget } },
  build: { manifest: true, target: 'es2023', sourcemap: false, chunkSizeWarningLimit: 700 },
  worker: { format: 'es' },
});
