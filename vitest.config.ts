import vue from '@vitejs/plugin-vue';
import { quasar, transformAssetUrls } from '@quasar/vite-plugin';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const folders = ['api', 'assets', 'boot', 'components', 'composables', 'layouts', 'pages', 'router', 'stores'];
const alias = { ...Object.fromEntries(folders.map((name) => [name, at(`src/${name}`)])), src: at('src') };

/** Tests that share the database server or the browser: one file at a time would be slow, many too heavy for two cores. */
const withDatabase = {
  environment: 'node' as const,
  globalSetup: ['tests/helpers/database-server.ts'],
  pool: 'forks' as const,
  testTimeout: 60_000,
  hookTimeout: 120_000,
};

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          include: [
            'tests/engine/**/*.test.ts',
            'tests/document/**/*.test.ts',
            'tests/cases/**/*.test.ts',
            'tests/setup/**/*.test.ts',
          ],
          testTimeout: 60_000,
        },
      },
      {
        plugins: [vue({ template: { transformAssetUrls } }), quasar()],
        resolve: { alias },
        test: {
          name: 'app',
          environment: 'happy-dom',
          include: ['tests/app/**/*.test.ts'],
          setupFiles: ['tests/helpers/app.ts'],
        },
      },
      {
        test: {
          name: 'server',
          ...withDatabase,
          include: ['tests/server/**/*.test.ts', 'tests/collaboration/**/*.test.ts'],
        },
      },
      {
        test: {
          name: 'browser',
          ...withDatabase,
          include: ['tests/browser/**/*.test.ts'],
          testTimeout: 240_000,
          hookTimeout: 240_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
