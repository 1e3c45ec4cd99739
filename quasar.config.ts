import { spawnSync } from 'node:child_process';
import { defineConfig } from '#q-app/wrappers';

const apiTarget = process.env.API_TARGET ?? 'http://127.0.0.1:8417';

/**
 * Packages that only lazily loaded pages import. Named here so that the development server prepares
 * them at once; otherwise the first visit answers "outdated optimize dep" and reloads.
 */
const lazyPackages = [
  '@codemirror/autocomplete',
  '@codemirror/commands',
  '@codemirror/language',
  '@codemirror/lint',
  '@codemirror/search',
  '@codemirror/state',
  '@codemirror/view',
  '@lezer/common',
  '@lezer/highlight',
  '@lezer/lr',
  'katex',
  'lib0/decoding',
  'lib0/encoding',
  'lib0/observable',
  'markdown-it',
  'socket.io-client',
  'y-codemirror.next',
  'y-indexeddb',
  'y-protocols/awareness',
  'y-protocols/sync',
  'yjs',
  'zod',
];

export default defineConfig(() => ({
  boot: ['session', 'activity', 'prefetch'],
  css: ['fonts.css', 'app.scss'],
  extras: [],

  build: {
    target: { browser: ['es2022', 'firefox115', 'chrome115', 'safari16'], node: 'node20' },
    typescript: { strict: true, vueShim: true },
    vueRouterMode: 'history',
    extendViteConf: (config) => {
      // The server puts a fresh nonce in place of this word in every answer (Content Security Policy).
      config.html = { cspNonce: '__CSP_NONCE__' };
      // Small fonts and pictures stay files: `data:` is not among the allowed sources of fonts.
      config.build = { ...config.build, assetsInlineLimit: 0 };
      config.worker = { ...config.worker, format: 'es' };
      config.optimizeDeps = { ...config.optimizeDeps, include: lazyPackages };
    },
    afterBuild: () => {
      const { status } = spawnSync(process.execPath, ['src-server/setup/check-size.mjs'], { stdio: 'inherit' });
      if (status !== 0) throw new Error('the first load is too large');
    },
  },

  devServer: {
    port: 9000,
    open: false,
    proxy: {
      '/api': { target: apiTarget },
      '/sync': { target: apiTarget, ws: true },
      '/socket.io': { target: apiTarget, ws: true },
    },
  },

  framework: {
    iconSet: 'svg-material-icons',
    config: {
      ripple: false,
      loadingBar: { color: 'primary', size: '2px', position: 'top', skipHijack: true },
      notify: { position: 'bottom', timeout: 6000, classes: 'wf-notice', color: 'transparent', textColor: 'inherit' },
    },
    plugins: ['Dialog', 'LoadingBar', 'Notify'],
  },
}));
