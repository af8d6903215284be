// @ts-check
/** What lint holds: the language at its strictest, and which layer may import which (the map is in DEVELOPERS.md). */
import astro from 'eslint-plugin-astro';
import tseslint from 'typescript-eslint';

/**
 * A rule against imports, with what to do instead. ESLint keeps only the last `no-restricted-imports` that fits a file,
 * so each folder lists all of its own.
 * @param {readonly string[]} files
 * @param {readonly { regex: string, message: string, allowTypeImports?: boolean }[]} patterns
 * @returns {import('typescript-eslint').ConfigWithExtends}
 */
function layer(files, patterns) {
  return { files: [...files], rules: { '@typescript-eslint/no-restricted-imports': ['error', { patterns: [EVERYWHERE, ...patterns] }] } };
}

const EVERYWHERE = { regex: '^\\.\\./(?!.*/content/)', message: 'Import through the layer (#core/…, #server/…), so that a moved file breaks nothing and the layer shows.' };
const NO_NODE = { regex: '^node:|^#server/|^#stand-ins/|^astro(?!/zod)|^react|^sequelize', message: 'This layer is pure: hand in what it needs to know (time, chance, files) as arguments.' };
const NO_EDGE = { regex: '^#(?:pages|actions|middleware|processes)', message: 'Edges import the house, never the other way round.' };
const NO_BROWSER = { regex: '^#(?:islands|components|layouts)/|^react|^astro:|^astro/(?!zod)', message: 'The server draws nothing and knows no Astro: return plain data and let the page draw it.' };
const NO_SEQUELIZE = { regex: '^sequelize|^mariadb|^umzug', message: 'Rows are reached through models and queries: add a query or a method there.' };
const NO_LUCIA = { regex: '^lucia', message: 'Sessions go through #server/auth/sessions.ts, the one file that may be rewritten without Lucia.' };
const NO_SERVER = { regex: '^#server/|^#stand-ins/|^node:', message: 'Browser code never reaches the server: name what crosses the wire in #contracts/ and call an action or an endpoint.' };

export default tseslint.config(
  { ignores: ['dist/', '.astro/', '.data/', 'uploads/', 'coverage/', 'test-results/', 'node_modules/', 'content/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' }, plugins: { '@typescript-eslint': tseslint.plugin } },
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.strictTypeChecked, tseslint.configs.stylisticTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports', prefer: 'type-imports' }],
      // Numbers and truth in texts are meant; objects and nothing are not.
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true, allowBoolean: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true, ignoreVoidOperator: true }],
      '@typescript-eslint/no-unnecessary-condition': ['error', { allowConstantLoopConditions: true }],
      // A method may be async because its port says so, whatever it does inside.
      '@typescript-eslint/require-await': 'off',
      // A list's first places may be empty (noUncheckedIndexedAccess), which this rule does not know.
      '@typescript-eslint/no-useless-default-assignment': 'off',
      // An assertion may be there for the reader.
      '@typescript-eslint/no-unnecessary-type-assertion': 'off',
      // Letters are counted as code points on purpose.
      '@typescript-eslint/no-misused-spread': 'off',
      // Sequelize makes instances in its own ways.
      '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
      // "a === null || a.b" says what it means.
      '@typescript-eslint/prefer-optional-chain': 'off',
      // The compiler asks for brackets at names that nobody promised (noPropertyAccessFromIndexSignature is off).
      '@typescript-eslint/dot-notation': 'off',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true, allowEmpty: true }],
      'no-console': ['error', { allow: ['error', 'warn'] }],
      'max-lines': ['warn', { max: 300, skipBlankLines: false }],
      'no-restricted-syntax': ['error',
        { selector: 'ExportDefaultDeclaration', message: 'Export by name: a thing is called the same everywhere.' },
        { selector: "MemberExpression[object.object.name='process'][object.property.name='env'], MemberExpression[object.name='process'][property.name='env']", message: 'Only #server/config.ts reads the environment: take the setting from config().' },
        { selector: "CallExpression[callee.object.name='sequelize'][callee.property.name='transaction']", message: 'Use withTransaction: it joins, retries deadlocks and keeps the lock first.' },
        { selector: "Property[key.name='skipLocked']", message: 'Sequelize drops skipLocked silently for MariaDB: claim rows by raw FOR UPDATE SKIP LOCKED.' },
        { selector: "MetaProperty[property.name='meta'] ~ Identifier[name='env']", message: 'import.meta.env is frozen into the build: take the setting from config().' },
      ],
    },
  },
  ...astro.configs['flat/recommended'],
  { files: ['**/*.astro'], rules: { 'astro/no-set-html-directive': 'error' } },
  // Drawings are made by core from checked numbers and escaped words.
  { files: ['src/components/cloth/**', 'src/components/lesson/Figure*.astro'], rules: { 'astro/no-set-html-directive': 'off' } },
  // Data in the words of schema.org, in which no sign can end its element.
  { files: ['src/components/site/ToldOutside.astro'], rules: { 'astro/no-set-html-directive': 'off' } },

  layer(['src/core/**'], [{ ...NO_NODE, regex: `${NO_NODE.regex}|^#contracts/|^zod|^astro` }, NO_EDGE, NO_BROWSER]),
  layer(['src/contracts/**'], [NO_NODE, NO_EDGE, NO_BROWSER]),
  layer(['src/server/**'], [NO_EDGE, NO_BROWSER, NO_SEQUELIZE, NO_LUCIA, { regex: '^#stand-ins/', message: 'Stand-ins are for demonstrations: real code may not lean on them.' }]),
  layer(['src/server/{db,models,queries,use-cases,jobs,mail,notices}/**', 'src/server/web/{rate-limit,readiness-checks}.ts'], [NO_EDGE, NO_BROWSER, NO_LUCIA]),
  layer(['src/server/auth/**'], [NO_EDGE, NO_BROWSER]),
  layer(['src/server/policies/**'], [NO_EDGE, NO_BROWSER, NO_SEQUELIZE, NO_LUCIA, { regex: '^#server/(?!policies/|context|errors)', message: 'A policy judges facts it is handed: load them in the use-case or query.', allowTypeImports: true }]),
  layer(['src/stand-ins/**'], [NO_EDGE, NO_SEQUELIZE, { regex: '^#server/', message: 'A stand-in plays somebody outside the house and knows nothing of its inside.' }]),
  layer(['src/service-worker/**'], [NO_SERVER, NO_SEQUELIZE, NO_EDGE, NO_BROWSER]),
  layer(['src/islands/**'], [NO_SERVER, NO_SEQUELIZE, NO_EDGE]),
  layer(['src/components/**', 'src/layouts/**'], [
    { regex: '^#server/(?!web/|presenters/|queries/|context\\.ts)|^#stand-ins/', message: 'A component draws what it is handed: let the page ask a query and pass plain data.' },
    NO_EDGE,
  ]),
  layer(['src/pages/**', 'src/actions/**', 'src/middleware.ts', 'src/live.config.ts'], [NO_SEQUELIZE, NO_LUCIA]),

  { files: ['src/processes/**', 'tests/**'], rules: { 'no-console': 'off' } },
  { files: ['src/server/config.ts', 'src/server/db/{migrator,transaction}.ts', 'tests/**'], rules: { 'no-restricted-syntax': 'off' } },
  { files: ['**/*.d.ts'], rules: { '@typescript-eslint/consistent-type-imports': 'off' } },
  { files: ['**/*.config.{ts,mjs}', 'src/content.config.ts'], rules: { 'no-restricted-syntax': 'off' } },
  { files: ['tests/**'], rules: { '@typescript-eslint/no-restricted-imports': 'off', '@typescript-eslint/unbound-method': 'off', '@typescript-eslint/no-unsafe-assignment': 'off', '@typescript-eslint/no-base-to-string': 'off', '@typescript-eslint/no-confusing-void-expression': 'off', '@typescript-eslint/no-unsafe-return': 'off', '@typescript-eslint/consistent-type-imports': 'off' } },
);
