/* Lint rules: strict TypeScript, the layers of the architecture (imports run downwards only, no cycles) and the purity of the pure layers. */
import tseslint from 'typescript-eslint';
import astro from 'eslint-plugin-astro';
import { importX } from 'eslint-plugin-import-x';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import reactHooks from 'eslint-plugin-react-hooks';

/** Folder → what it may import of ours. Everything else is refused. */
const LAYERS = {
  'src/engine': [],
  'src/domain': ['src/engine'],
  'src/checks': ['src/engine'],
  workflows: ['src/domain', 'src/engine'],
  'src/data': ['src/domain', 'src/engine'],
  'src/auth': ['src/domain', 'src/data', 'src/engine'],
  'src/notices': ['src/domain', 'src/data', 'src/engine'],
  'src/files': ['src/domain', 'src/data', 'src/engine'],
  'src/services': ['src/domain', 'src/data', 'src/engine', 'src/checks', 'workflows', 'src/notices', 'src/files', 'src/auth'],
  'src/papers': ['src/domain', 'src/engine', 'src/services'],
  'src/islands': ['src/domain', 'src/engine', 'workflows'],
  'src/components': ['src/domain', 'src/engine', 'src/services', 'src/islands'],
  'src/layouts': ['src/domain', 'src/engine', 'src/services', 'src/components', 'src/islands', 'src/styles'],
};
const ALL = [...Object.keys(LAYERS), 'src/pages', 'src/styles', 'src/middleware.ts', 'src/server.ts', 'src/config.ts', 'seeds', 'migrations', 'tests', 'scripts'];
const zones = Object.entries(LAYERS).map(([target, allowed]) => ({
  target: `./${target}`,
  from: ALL.filter((folder) => folder !== target && !allowed.includes(folder)).map((folder) => `./${folder}`),
  // The pictures are pure functions that give SVG as text: an island draws the same one as the server.
  except: target === 'src/islands' ? ['./pictures'] : [],
  message: `${target} may import only: ${allowed.join(', ') || 'its own files'}.`,
}));

const IMPURE_GLOBALS = ['Date', 'fetch', 'process', 'Buffer', 'window', 'document', 'localStorage', 'performance', 'crypto'].map((name) => ({
  name,
  message: 'engine, domain and workflows are pure: take it as an argument.',
}));

export default tseslint.config(
  { ignores: ['dist', '.astro', 'node_modules', 'data', 'test-results', 'playwright-report'] },
  ...tseslint.configs.strict,
  ...astro.configs.recommended,
  {
    plugins: { 'import-x': importX },
    settings: { 'import-x/resolver-next': [createTypeScriptImportResolver({ alwaysTryTypes: true })] },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': ['error', { ignoreExternal: true }],
      'import-x/no-default-export': 'off',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-non-null-assertion': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    files: ['src/engine/**/*.ts', 'src/domain/**/*.ts', 'workflows/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', ...IMPURE_GLOBALS],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'Pure layers take randomness as an argument.' }],
      'no-restricted-imports': ['error', { patterns: [{ group: ['node:*', 'astro', 'astro:*', 'knex', 'react', 'react-dom', 'better-sqlite3'], message: 'A pure layer.' }] }],
    },
  },
  { files: ['src/islands/**/*.tsx', 'src/islands/**/*.ts'], plugins: { 'react-hooks': reactHooks }, rules: reactHooks.configs.recommended.rules },
  { files: ['tests/**', 'scripts/**', '*.config.*', 'seeds/**'], rules: { '@typescript-eslint/no-non-null-assertion': 'off' } },
);
