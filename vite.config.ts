import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

/** Where the development server of the API listens; see server/setup/dev.mjs. */
const api = `http://127.0.0.1:${process.env['API_PORT'] ?? '3000'}`;

export default defineConfig({
  root: 'src',
  publicDir: '../public',
  plugins: [react(), tailwindcss()],
  build: { outDir: '../dist/client', emptyOutDir: true, sourcemap: false },
  server: { proxy: { '/api': api } },
});
