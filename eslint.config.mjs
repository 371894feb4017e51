import next from 'eslint-config-next/core-web-vitals'
import tseslint from 'typescript-eslint'
import { banned, bannedFor, houseRules } from './scripts/lint/house-rules.mjs'

const SOURCES = ['**/*.ts', '**/*.tsx']
const PURE = [
  'lib/rules/**',
  'lib/checklist/**',
  'lib/inspection/**',
  'lib/pass/**',
  'lib/planning/**',
  'lib/permissions/**',
  'lib/walk/**',
  'lib/sync/core/**',
]

export default tseslint.config(
  {
    ignores: [
      '.next/**',
      '.demo/**',
      '.test/**',
      'node_modules/**',
      'coverage/**',
      'data/**',
      'public/**',
      'next-env.d.ts',
      'db/migrations/**',
    ],
  },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...next,
  { plugins: { house: houseRules }, rules: { 'house/file-name': 'error', 'house/disable-needs-reason': 'error' } },
  {
    // What eslint-config-next brings its plugins for; a .cjs of a tool is none of it.
    files: ['**/*.{ts,tsx,js,jsx,mjs}'],
    rules: {
      'no-eval': 'error',
      eqeqeq: 'error',
      'prefer-const': 'error',
      'no-var': 'error',
      'react/jsx-no-target-blank': 'error',
      'react/no-danger': 'error',
      'import/no-anonymous-default-export': 'off',
    },
  },
  {
    files: SOURCES,
    extends: [...tseslint.configs.strictTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/no-explicit-any': ['error', { fixToUnknown: true }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false }],
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true, allowBoolean: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true }],
      '@typescript-eslint/ban-ts-comment': ['error', { 'ts-expect-error': 'allow-with-description', minimumDescriptionLength: 10 }],
      '@typescript-eslint/only-throw-error': 'error',
      // Promise-returning interfaces are kept by functions that have nothing to await yet.
      '@typescript-eslint/require-await': 'off',
      // `readonly T[]` reads better and `() => void` shorthand in handlers is ours.
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      // Prose types such as `type PassId = string` are ours on purpose.
      '@typescript-eslint/no-redundant-type-constituents': 'off',
      // noUncheckedIndexedAccess makes these checks necessary; the rule does not see everything (records from JSON).
      '@typescript-eslint/no-unnecessary-condition': 'off',
      '@typescript-eslint/unified-signatures': 'off',
      '@typescript-eslint/no-unnecessary-type-arguments': 'off',
      '@typescript-eslint/no-unnecessary-type-parameters': 'off',
      'no-console': ['error'],
      ...banned({}),
    },
  },
  // A `use…` outside screens is an ordinary verb (`useDatabase`), not a hook.
  { files: ['**/*.ts'], ignores: ['**/use-*.ts'], rules: { 'react-hooks/rules-of-hooks': 'off' } },
  { files: ['*.mjs', 'app/**/*.mjs', 'lib/**/*.mjs'], rules: banned({}) },
  { files: PURE, ignores: ['**/*.test.ts'], rules: bannedFor.pure },
  { files: ['lib/platform/session.ts', 'lib/platform/session/**'], rules: banned({ allow: ['lucia'] }) },
  { files: ['lib/scanner/**'], rules: banned({ allow: ['html5-qrcode'] }) },
  { files: ['app/_worker/with-worker.mjs'], rules: banned({ allow: ['next-pwa'] }) },
  { files: ['db/schema/index.ts'], rules: banned({ allow: ['export *'] }) },
  { files: ['lib/platform/log.ts', 'db/seed.ts', 'scripts/**', 'tests/bench/**'], rules: { 'no-console': 'off' } },
  {
    files: ['tests/**'],
    rules: {
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/unbound-method': 'off',
      'no-console': 'off',
    },
  },
  // Its examples are breaches on purpose.
  { files: ['tests/architecture/house-rules.test.ts'], rules: { 'no-restricted-syntax': 'off' } },
)
