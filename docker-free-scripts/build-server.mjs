/** Bundles server/main/start.ts with the rooms it uses into dist/server/main.js, and the thread that derives readings beside it; packages stay in node_modules. */
import { rmSync } from 'node:fs';
import { build } from 'esbuild';

rmSync('dist/server', { recursive: true, force: true });
await build({
  entryPoints: {
    main: 'server/main/start.ts',
    'derive-thread': 'server/features/readings/derive-thread.ts',
  },
  outdir: 'dist/server',
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: true,
  logLevel: 'warning',
});
