import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  root: 'app',
  publicDir: '../public',
  cacheDir: '../.cache/vite',
  // Relative addresses, so that the built folder can be hosted under any path.
  base: './',
  plugins: [react()],
  worker: { format: 'es' },
  build: {
    outDir: '../dist',
    emptyOutDir: true,
    target: 'baseline-widely-available',
    // HiGHS (wasm) is meant to be a file of its own, and no asset may become a data: address the policy refuses.
    assetsInlineLimit: 0,
    rolldownOptions: {
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
