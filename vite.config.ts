import { readdirSync } from 'node:fs';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig, type Plugin } from 'vite';
import { licenceFiles } from './docker-free-scripts/licences/licence-files.ts';

/** In development the athlete's address opens its own small page, as the server does it when built. */
const replayPage: Plugin = {
  name: 'replay-page',
  configureServer(server) {
    server.middlewares.use((request, _response, next) => {
      if (request.url?.startsWith('/r/')) request.url = '/replay.html';
      next();
    });
  },
};

/** The packages' licences as files beside the pages; in development made anew for each start. */
const licences: Plugin = {
  name: 'licences',
  generateBundle() {
    for (const { name, text } of licenceFiles('.'))
      this.emitFile({ type: 'asset', fileName: name, source: text });
  },
  configureServer(server) {
    const files = new Map(licenceFiles('.').map(({ name, text }) => [`/${name}`, text]));
    server.middlewares.use((request, response, next) => {
      const text = files.get(request.url ?? '');
      if (text === undefined) return next();
      const type = request.url?.endsWith('.json') ? 'application/json' : 'text/plain';
      response.setHeader('Content-Type', `${type}; charset=utf-8`);
      response.end(text);
    });
  },
};

export default defineConfig({
  plugins: [react(), tailwindcss(), replayPage, licences],
  build: {
    outDir: 'dist/web',
    emptyOutDir: true,
    target: 'es2023',
    // the content policy allows no data: fonts and no inlined workers
    assetsInlineLimit: 0,
    sourcemap: true,
    // every page file at the root is an entry of its own, with its own first script
    rollupOptions: { input: readdirSync('.').filter((name) => name.endsWith('.html')) },
  },
  worker: { format: 'es' },
  server: {
    host: process.env.HOST ?? '127.0.0.1',
    port: Number(process.env.WEB_PORT ?? 5173),
    strictPort: true,
    proxy: { '/api': { target: process.env.API_URL ?? 'http://127.0.0.1:4600' } },
  },
});
