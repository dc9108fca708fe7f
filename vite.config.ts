import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';
import react from '@vitejs/plugin-react';
import tailwindcss from '@tailwindcss/vite';

const FINDINGS_WORKER = '/src/workers/findings.worker.ts';

/**
 * `virtual:findings-worker` is the address of the findings worker. Built, the worker is one more entry of the page's own
 * graph, so that the code which both need is one file that comes once; Vite's own way builds it apart, with its own copy.
 */
function findingsWorker(): Plugin {
  const name = 'virtual:findings-worker';
  let isBuild = false;
  return {
    name: 'findings-worker',
    configResolved: ({ command }) => void (isBuild = command === 'build'),
    resolveId: (id) => (id === name ? `\0${name}` : null),
    load(id) {
      if (id !== `\0${name}`) return null;
      if (!isBuild) return `export { default } from '${FINDINGS_WORKER}?worker&url';`;
      const chunk = this.emitFile({ type: 'chunk', id: FINDINGS_WORKER, name: 'findings-worker' });
      return `export default import.meta.ROLLUP_FILE_URL_${chunk};`;
    },
  };
}

export default defineConfig({
  plugins: [react(), tailwindcss(), findingsWorker()],
  build: { outDir: 'dist/client', emptyOutDir: true, manifest: true, target: 'es2022', assetsInlineLimit: 0 },
  worker: { format: 'es' },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'node',
          environment: 'node',
          include: ['tests/{architecture,shared,server,standards,security}/**/*.test.ts'],
          setupFiles: ['tests/support/matchers.ts'],
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/support/matchers.ts', 'tests/support/jsdom.ts'],
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          setupFiles: ['tests/support/matchers.ts'],
          testTimeout: 90_000,
          hookTimeout: 120_000,
          // A busy machine is slow, not wrong; what must be quick says so in its own test.
          expect: { poll: { timeout: 10_000 } },
          fileParallelism: false,
        },
      },
    ],
  },
});
