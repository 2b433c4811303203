import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import { importX } from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

const rooms = [
  'app', 'server', 'db', 'tests',
  'shared/chemistry', 'shared/statistics', 'shared/marking', 'shared/sheets', 'shared/contracts', 'shared/client', 'shared/ui', 'shared/screens',
];

/** A room may import itself and the rooms named. */
const only = (target, ...allowed) => ({ target: `./${target}`, from: rooms.filter((room) => room !== target && !allowed.includes(room)).map((room) => `./${room}`) });
const never = (target, ...from) => ({ target: `./${target}`, from: from.map((room) => `./${room}`) });

/** Who may import whom; the table of rooms in DEVELOPERS.md says the same in words. */
const zones = [
  only('shared/chemistry'),
  only('shared/statistics'),
  only('shared/marking', 'shared/chemistry'),
  only('shared/sheets'),
  only('shared/contracts', 'shared/marking', 'shared/chemistry', 'shared/statistics', 'shared/sheets'),
  only('shared/client', 'shared/contracts', 'shared/marking', 'shared/chemistry', 'shared/statistics', 'shared/sheets'),
  only('shared/ui'),
  only('shared/screens', 'shared/chemistry', 'shared/statistics', 'shared/marking', 'shared/sheets', 'shared/contracts', 'shared/client', 'shared/ui'),
  only('app', 'shared/client', 'shared/ui', 'shared/screens'),
  only('db', 'shared/chemistry', 'shared/statistics', 'shared/marking', 'shared/sheets', 'shared/contracts'),
  only('server', 'db', 'shared/chemistry', 'shared/statistics', 'shared/marking', 'shared/sheets', 'shared/contracts'),
  never('server/routes', 'db'),
  never('server/services', 'server/routes', 'server/http'),
  never('server/ingest', 'server/routes', 'server/services', 'db'),
  never('server/print', 'server/routes', 'server/services', 'server/http', 'db'),
  never('server/storage', 'server/routes', 'server/services', 'db'),
  never('server/jobs', 'server/routes', 'server/services'),
  never('server/auth', 'server/routes', 'server/services'),
  never('server/http', 'server/routes', 'server/services'),
].map((zone) => ({ ...zone, message: 'This room may not reach into that one: see the table of rooms in DEVELOPERS.md.' }));

export default tseslint.config(
  { ignores: ['node_modules', 'dist', 'uploads', 'coverage', '.expo', 'db/migrations', 'expo-env.d.ts'] },
  ...tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    plugins: { 'import-x': importX, 'react-hooks': reactHooks },
    settings: { 'import-x/resolver-next': [createTypeScriptImportResolver({ noWarnOnMultipleProjects: true, project: ['tsconfig.json', 'tsconfig.server.json'] })] },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': ['error', { maxDepth: 8 }],
      'react-hooks/rules-of-hooks': 'error',
      'react-hooks/exhaustive-deps': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { disallowTypeAnnotations: false }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    files: ['shared/chemistry/**/*.ts', 'shared/marking/**/*.ts'],
    ignores: ['**/*.test.ts', 'shared/chemistry/data/generate.ts'],
    rules: {
      // Typed answers never pass through binary floats.
      'no-restricted-globals': ['error', { name: 'parseFloat', message: 'Read typed text with the grammar of shared/marking.' }],
    },
  },
  {
    files: ['shared/**/*.{ts,tsx}', 'app/**/*.tsx'],
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ group: ['@react-navigation/*'], message: 'expo-router has its own entry points.' }] },
      ],
    },
  },
  {
    files: ['shared/client/**/*.{ts,tsx}', 'shared/screens/**/*.{ts,tsx}', 'shared/ui/**/*.{ts,tsx}'],
    ignores: ['**/*.test.ts'],
    rules: {
      // A value of a contract brings the validator into the first load; enumerations have a file without it.
      '@typescript-eslint/no-restricted-imports': [
        'error',
        { patterns: [{ regex: 'contracts/(?!enums$)', allowTypeImports: true, message: 'Import types only; values that screens need live in contracts/enums.' }] },
      ],
    },
  },
);
