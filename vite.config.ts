import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const apiOrigin = process.env['FERRULE_API_ORIGIN'] ?? 'http://127.0.0.1:4310';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist/web',
    emptyOutDir: true,
    manifest: true,
    // A data: URL would need a wider Content-Security-Policy, so nothing is inlined.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
  server: {
    host: '127.0.0.1',
    port: Number(process.env['FERRULE_WEB_PORT'] ?? 5173),
    strictPort: true,
    proxy: {
      '/api': { target: apiOrigin },
      '/socket.io': { target: apiOrigin, ws: true },
    },
  },
});
