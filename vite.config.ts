import { fileURLToPath } from 'node:url';
import tailwind from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

// The dashboard: web/ becomes dist/web/. Nothing is inlined as data:, which the content security policy refuses.
export default defineConfig({
  root: here('web'),
  plugins: [react(), tailwind()],
  resolve: { alias: { '#core': here('core'), '#web': here('web') } },
  build: { outDir: here('dist/web'), emptyOutDir: true, assetsInlineLimit: 0 },
  server: { proxy: { '^/api/(?!.*\\.ts(\\?|$))': 'http://127.0.0.1:4780' }, fs: { allow: [here('.')] } },
});
