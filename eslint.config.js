import vue from 'eslint-plugin-vue';
import { defineConfig, globalIgnores } from 'eslint/config';
import tseslint from 'typescript-eslint';
import { importProblem, pureFolders } from './test/helpers/import-table.ts';

const pureSources = pureFolders.map((folder) => `src-main/${folder}/**/*.ts`);
const network = ['fetch', 'XMLHttpRequest', 'WebSocket', 'EventSource', 'WebTransport', 'RTCPeerConnection'];
const clockAndWorld = ['Date', 'performance', 'console', 'process', 'crypto', 'setTimeout', 'setInterval', 'Buffer'];

const globals = (names, message) => names.map((name) => ({ name, message }));

/** Who may import whom, from the same table as test/unit/imports.test.ts. */
const importTableRule = {
  create(context) {
    const from = context.physicalFilename.slice(context.cwd.length + 1).replaceAll('\\', '/');
    const check = (source, isTypeOnly) => {
      if (typeof source?.value !== 'string') return;
      const problem = importProblem({ from, specifier: source.value, isTypeOnly });
      if (problem) context.report({ node: source, message: problem });
    };
    const isTypesOnly = ({ importKind, specifiers }) =>
      importKind === 'type' || (specifiers.length > 0 && specifiers.every((one) => one.importKind === 'type'));
    return {
      ImportDeclaration: (node) => check(node.source, isTypesOnly(node)),
      ExportNamedDeclaration: (node) => check(node.source, node.exportKind === 'type'),
      ExportAllDeclaration: (node) => check(node.source, node.exportKind === 'type'),
      ImportExpression: (node) => check(node.source, false),
    };
  },
};

export default defineConfig(
  globalIgnores(['out/', '.cache/', 'coverage/', 'demo-projects/']),
  {
    // A rule that does not fit is changed here, for everybody.
    linterOptions: { noInlineConfig: true },
  },
  {
    files: ['**/*.js', '**/*.mjs'],
    languageOptions: { globals: { console: false, process: false, URL: false, performance: false } },
  },
  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { project: 'tsconfig.lint.json', tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true, allowNullish: true },
      ],
      // Objects here come from functions, not from classes: a method taken off its object loses nothing.
      '@typescript-eslint/unbound-method': 'off',
      // An async function without await keeps the promise of its interface, and rejects instead of throwing.
      '@typescript-eslint/require-await': 'off',
    },
  },
  {
    // Their types are checked by vue-tsc; a linter that asks for types would build the program anew for each component.
    files: ['**/*.vue'],
    extends: [tseslint.configs.recommended, vue.configs['flat/essential']],
    languageOptions: { parserOptions: { parser: tseslint.parser } },
    rules: {
      'vue/block-lang': ['error', { script: { lang: 'ts' } }],
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/no-v-html': 'error',
    },
  },
  {
    files: ['**/*.ts', '**/*.vue'],
    rules: {
      '@typescript-eslint/consistent-type-imports': [
        'error',
        { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false },
      ],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-eval': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-restricted-exports': ['error', { restrictDefaultExports: { direct: true, named: true, defaultFrom: true } }],
    },
  },
  {
    files: ['src-main/**/*.ts', 'src-renderer/**/*.ts', 'src-renderer/**/*.vue'],
    plugins: { footing: { rules: { 'import-table': importTableRule } } },
    rules: {
      'footing/import-table': 'error',
      'no-restricted-globals': ['error', ...globals(network, 'Footing makes no network request.')],
    },
  },
  {
    files: pureSources,
    rules: {
      'no-restricted-globals': [
        'error',
        ...globals(network, 'Footing makes no network request.'),
        ...globals(
          [...clockAndWorld, 'window', 'document', 'navigator'],
          'Pure code knows no clock, no console and no machine.',
        ),
      ],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'Chance has a seed here.' }],
    },
  },
  // The one place that talks to a host.
  { files: ['src-renderer/bridge/*.ts'], rules: { 'no-restricted-globals': 'off' } },
  {
    // Components are of no type that this linter knows.
    files: ['test/screens/**/*.ts', 'test/helpers/mount-screen.ts'],
    rules: { '@typescript-eslint/no-unsafe-argument': 'off', '@typescript-eslint/no-unsafe-assignment': 'off' },
  },
  // Tools that take their settings as a default export.
  { files: ['*.config.ts'], rules: { 'no-restricted-exports': 'off' } },
);
