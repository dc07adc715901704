import react from '@vitejs/plugin-react';
import { defineConfig, type Rolldown } from 'vite';

/** highs reads node:module where it runs in Node, behind a test for Node: no news to whoever builds the app. */
const onLog: Rolldown.InputOptions['onLog'] = (level, log, print) => {
  if (!(log.message.includes('"node:module" has been externalized') && log.message.includes('highs')))
    print(level, log);
};

export default defineConfig({
  root: 'app',
  publicDir: '../public',
  cacheDir: '../.cache/vite',
  // Relative addresses, so that the built folder can be hosted under any path.
  base: './',
  plugins: [react()],
  worker: { format: 'es', rolldownOptions: { onLog } },
  build: {
    outDir: '../dist',
    emptyOutDir: true,
    target: 'baseline-widely-available',
    // HiGHS (wasm) is meant to be a file of its own, and no asset may become a data: address the policy refuses.
    assetsInlineLimit: 0,
    rolldownOptions: {
      onLog,
      output: {
        codeSplitting: {
          // The chart is loaded after the first paint. A group draws in the dependencies of its modules, so what
          // the page and the chart share is claimed first: the page would otherwise wait for the chart's chunk.
          groups: [
            {
              name: 'base',
              test: /node_modules[\\/](react|react-dom|scheduler|zustand|immer|use-sync-external-store|idb)[\\/]/,
              priority: 2,
            },
            { name: 'chart', test: /node_modules[\\/]recharts[\\/]/, priority: 1 },
          ],
        },
      },
    },
  },
});
