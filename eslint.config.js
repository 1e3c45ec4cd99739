import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import { importX } from 'eslint-plugin-import-x';
import vue from 'eslint-plugin-vue';
import globals from 'globals';
import tseslint from 'typescript-eslint';
import vueParser from 'vue-eslint-parser';

/** The floors of the product: a folder may not import from those above it. */
const floors = [
  ['./src/engine/errors', ['./src/engine/!(errors)']],
  ['./src/engine/units', ['./src/engine/!(errors|units)']],
  ['./src/engine/numerics', ['./src/engine/!(errors|numerics)']],
  ['./src/engine/graph', ['./src/engine/!(errors|graph)']],
  ['./src/engine/language', ['./src/engine/(evaluation|properties|relations|calculation|uncertainty)']],
  ['./src/engine/evaluation', ['./src/engine/(properties|relations|calculation|uncertainty)']],
  ['./src/engine/properties', ['./src/engine/(language|evaluation|relations|calculation|uncertainty)']],
  ['./src/engine/relations', ['./src/engine/(evaluation|properties|uncertainty)']],
  ['./src/engine', ['./src/!(engine)', './src-server']],
  ['./src/document', ['./src/!(engine|document)', './src-server']],
  ['./src/contract', ['./src/!(engine|contract)', './src-server']],
  ['./src/workers', ['./src/(stores|composables|components|layouts|pages|router|boot)', './src-server']],
  ['./src/api', ['./src/(stores|composables|components|layouts|pages|router|boot)', './src-server']],
  ['./src/stores', ['./src/(composables|components|layouts|pages|router|boot)', './src-server']],
  ['./src/composables', ['./src/(components|layouts|pages|router|boot)', './src-server']],
  ['./src/components', ['./src/(layouts|pages|router|boot)', './src-server']],
  ['./src/layouts', ['./src/(pages|router|boot)', './src-server']],
  ['./src/pages', ['./src/(router|boot)', './src-server']],
  ['./src-server/repositories', ['./src-server/(services|middleware|routes|collaboration|realtime|jobs)']],
  ['./src-server/services', ['./src-server/(middleware|routes|collaboration|realtime)']],
  ['./src-server', ['./src/!(engine|document|contract)']],
];

export default tseslint.config(
  { ignores: ['dist/**', '.quasar/**', '.wallflux/**', 'node_modules/**', 'src/engine/language/grammar/parser*.ts'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.{ts,mts,js,mjs,vue}'],
    plugins: { 'import-x': importX },
    languageOptions: { globals: { ...globals.browser, ...globals.node } },
    settings: {
      'import-x/parsers': { '@typescript-eslint/parser': ['.ts', '.mts'] },
      'import-x/resolver-next': [createTypeScriptImportResolver({ project: './tsconfig.json' })],
    },
    rules: {
      'import-x/no-restricted-paths': [
        'error',
        {
          zones: floors.flatMap(([target, from]) => from.map((place) => ({ target, from: place }))),
        },
      ],
      'import-x/no-cycle': ['error', { ignoreExternal: true }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
      eqeqeq: 'error',
      'no-console': 'error',
    },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parser: vueParser, parserOptions: { parser: tseslint.parser } },
    rules: { 'vue/multi-word-component-names': 'off', 'vue/no-v-html': 'error', 'no-undef': 'off' },
  },
  { files: ['**/*.ts', '**/*.mts'], rules: { 'no-undef': 'off' } },
  {
    files: ['src-server/setup/**', 'src-server/commands/**', 'tests/bench/**', 'tests/check-values/**'],
    rules: { 'no-console': 'off' },
  },
  prettier,
);
