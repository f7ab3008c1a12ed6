import optimizeLocales from '@react-aria/optimize-locales-plugin';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';
import { fetchFrameAtOnce, firstChunks } from './apps/board/vite/first-chunks.ts';
import { lightContract } from './apps/board/vite/light-contract.ts';

const api = process.env['WEFTWAY_API'] ?? 'http://127.0.0.1:4310';

// The component library writes its English as en-US only; `en` keeps that and drops the other languages.
const spokenInTheApp = ['en'];

/**
 * Libraries mark their files for server components, which this app has none of; the recurrence library has a default
 * export for Node alone, which its wrapper asks for and does without in a browser.
 */
const expectedWarnings: readonly string[] = ['MODULE_LEVEL_DIRECTIVE', 'IMPORT_IS_UNDEFINED'];

export default defineConfig({
  plugins: [
    { ...optimizeLocales.vite({ locales: spokenInTheApp }), enforce: 'pre' },
    tailwindcss(),
    lightContract(),
    fetchFrameAtOnce(),
  ],
  build: {
    outDir: 'dist/board',
    emptyOutDir: true,
    // The content security policy allows files only: nothing may be written into the page or into a data address.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
    rolldownOptions: {
      output: { codeSplitting: firstChunks() },
      onwarn: (warning, report) => {
        if (!expectedWarnings.includes(warning.code ?? '')) report(warning);
      },
    },
  },
  // The API compares the page's origin with the host that was asked, so the host passes through unchanged.
  server: { proxy: { '^/api/': { target: api, changeOrigin: false } } },
  test: {
    passWithNoTests: false,
    projects: [
      {
        test: {
          name: 'node',
          environment: 'node',
          include: [
            'packages/**/*.test.ts',
            'apps/api/**/*.test.ts',
            'migrations/**/*.test.ts',
            'seeds/**/*.test.ts',
            'tests/**/*.test.ts',
          ],
        },
      },
      {
        extends: true,
        test: {
          name: 'jsdom',
          environment: 'jsdom',
          include: ['apps/board/**/*.test.{ts,tsx}'],
          setupFiles: ['apps/board/src/testing/setup.ts'],
        },
      },
    ],
  },
});
