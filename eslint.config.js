import js from '@eslint/js'
import globals from 'globals'
import vue from 'eslint-plugin-vue'
import tseslint from 'typescript-eslint'

const CODE = ['src/**/*.{ts,vue}', 'server/**/*.{ts,mjs}', 'shared/**/*.ts', 'migrations/**/*.ts']
const TESTS = ['tests/**/*.ts']
const everyTest = [
  { selector: "CallExpression[callee.property.name=/^(skip|only|todo|fixme)$/][callee.object.name=/^(it|test|describe)$/]", message: 'Every test runs.' },
  { selector: "CallExpression[callee.property.name='waitForTimeout']", message: 'Wait for what is awaited, not for time.' },
  { selector: "CallExpression[callee.name=/^(it|test)$/] > ArrowFunctionExpression[body.type='BlockStatement']:not(:has(CallExpression[callee.name=/^(expect|assert|check)/])):not(:has(MemberExpression[object.name=/^(assert|expect|fc)$/]))", message: 'A test asserts something.' },
]

/** The clock is injected: an instant that nobody can set makes a test that nobody can trust. */
const clock = [
  { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'Take the time from the injected clock.' },
  { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Take the time from the injected clock.' },
]
/** Raw form controls of Element Plus stand in App* alone. */
const CONTROLS = ['Button', 'Checkbox', 'CheckboxGroup', 'DatePicker', 'Dialog', 'Form', 'FormItem', 'Input', 'InputNumber', 'Option', 'Radio', 'RadioButton', 'RadioGroup', 'Select', 'Switch', 'TimePicker', 'TimeSelect']

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**', '.data/**', 'coverage/**', 'test-results/**', 'playwright-report/**', 'shots/**'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  ...vue.configs['flat/recommended'].map((config) => ({ ...config, files: ['**/*.vue'] })),
  {
    files: ['**/*.{ts,mjs,cjs,js,vue}'],
    languageOptions: { globals: { ...globals.node, ...globals.browser } },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: tseslint.parser, extraFileExtensions: ['.vue'] } },
  },
  // One rule needs types; two programs, no project service, keep the whole run short.
  {
    files: ['server/**/*.ts', 'shared/**/*.ts', 'migrations/**/*.ts'],
    languageOptions: { parserOptions: { project: './tsconfig.json', tsconfigRootDir: import.meta.dirname } },
    rules: { '@typescript-eslint/no-floating-promises': 'error' },
  },
  {
    files: ['src/**/*.ts'],
    languageOptions: { parserOptions: { project: './tsconfig.client.json', tsconfigRootDir: import.meta.dirname } },
    rules: { '@typescript-eslint/no-floating-promises': 'error' },
  },
  {
    files: ['**/*.{ts,vue}'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { disallowTypeAnnotations: false }],
      '@typescript-eslint/no-namespace': ['error', { allowDeclarations: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/ban-ts-comment': ['error', { 'ts-expect-error': false, 'ts-ignore': true, 'ts-nocheck': true }],
      'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx', 'hack'] }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      // TypeScript knows what is defined.
      'no-undef': 'off',
    },
  },
  {
    files: CODE,
    rules: {
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
      'no-restricted-syntax': ['error', ...clock],
    },
  },
  // Words a person typed are searched for control characters: that is what it is for.
  { files: ['shared/contract/text.ts'], rules: { 'no-control-regex': 'off' } },
  { files: ['**/*.cjs'], languageOptions: { sourceType: 'commonjs' } },
  { files: ['src/plugins/clock.ts', 'server/clock.ts', 'server/cli/**'], rules: { 'no-restricted-syntax': 'off', 'no-console': 'off' } },
  // A setup function of a store or a composable is a list of short functions, not one long one.
  { files: ['src/stores/**/*.ts', 'src/composables/**/*.ts'], rules: { 'max-lines-per-function': ['error', { max: 120, skipBlankLines: true, skipComments: true }] } },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/database/**'],
    rules: {
      'no-restricted-imports': ['error', {
        paths: [{ name: 'typeorm', importNames: ['DataSource', 'createConnection', 'getConnection'], message: 'Every query goes through the one door, inFarm.' }],
        patterns: [{ group: ['**/database/dataSource*', '**/database/ownerDataSource*', '**/src/**'], message: 'Every query goes through the one door; server and client never import each other.' }],
      }],
    },
  },
  {
    files: ['src/**/*.{ts,vue}'],
    rules: { 'no-restricted-imports': ['error', { patterns: [{ group: ['**/server/**', 'typeorm', 'express', 'pg'], message: 'The client imports shared, never the server.' }] }] },
  },
  {
    files: ['shared/**/*.ts'],
    rules: { 'no-restricted-imports': ['error', { paths: [{ name: 'temporal-polyfill', message: 'Take the functions from temporal-polyfill/fns: the classes weigh 12 kB more on a phone.' }],
        patterns: [{ group: ['**/server/**', '**/src/**', 'vue', 'express', 'typeorm', 'node:*'], message: 'shared is pure: libraries and shared alone.' }], }] },
  },
  {
    files: ['src/**/*.vue'],
    rules: {
      'vue/no-v-html': 'error',
      'vue/no-static-inline-styles': 'error',
      'vue/component-name-in-template-casing': ['error', 'PascalCase', { registeredComponentsOnly: false }],
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
      'vue/define-props-declaration': ['error', 'type-based'],
      'vue/define-emits-declaration': ['error', 'type-literal'],
      'vue/no-bare-strings-in-template': ['error', {
        allowlist: ['§', '·', '×', '−', '–', '—', '…', '°', '%', ',', '.', ':', ';', '(', ')', '/', '-', '+', '*', '|', '†', '\u2002', '&ensp;', '&nbsp;'],
      }],
      'vue/multi-word-component-names': ['error', { ignores: ['App'] }],
      // Laid out for reading, several to a line.
      'vue/max-attributes-per-line': 'off',
      'vue/singleline-html-element-content-newline': 'off',
      'vue/first-attribute-linebreak': 'off',
      'vue/html-closing-bracket-newline': 'off',
      'vue/html-closing-bracket-spacing': 'off',
      'vue/multiline-html-element-content-newline': 'off',
      'vue/html-indent': 'off',
      'vue/attributes-order': 'off',
      'vue/require-default-prop': 'off',
      'vue/html-self-closing': ['error', { html: { void: 'never', normal: 'always', component: 'always' } }],
    },
  },
  {
    files: ['src/**/*.vue'],
    ignores: ['src/components/app/**'],
    rules: {
      'no-restricted-imports': ['error', {
        paths: [{ name: 'element-plus', importNames: CONTROLS.map((name) => `El${name}`), message: 'Use the App* control.' }],
        patterns: [{ group: ['**/server/**'], message: 'The client imports shared, never the server.' }],
      }],
      'vue/no-restricted-component-names': ['error', ...CONTROLS.map((name) => `El${name}`)],
      'vue/no-restricted-html-elements': ['error', { element: CONTROLS.map((name) => `el-${name.toLowerCase()}`), message: 'Use the App* control.' }],
    },
  },
  {
    files: ['src/views/**/*.vue', 'src/components/**/*.vue'],
    rules: {
      'no-restricted-syntax': ['error', ...clock, {
        selector: "ImportDeclaration[importKind!='type'][source.value=/\\/api\\//]", message: 'Only composables and stores call the API.',
      }],
    },
  },
  {
    files: ['src/components/**/*.vue'],
    rules: {
      'no-restricted-syntax': ['error', ...clock, {
        selector: "ImportDeclaration[importKind!='type'][source.value=/\\/(api|stores|router)\\//]", message: 'A component gets props and emits.',
      }],
    },
  },
  {
    files: TESTS,
    rules: {
      'max-lines-per-function': 'off',
      'no-restricted-syntax': ['error', ...everyTest],
    },
  },
  {
    files: ['tests/**/*.test.ts'], ignores: ['**/*.mocked.test.ts'],
    rules: { 'no-restricted-syntax': ['error', ...everyTest, { selector: "CallExpression[callee.object.name='vi'][callee.property.name=/^(mock|doMock)$/]", message: 'Name the file *.mocked.test.ts: the others share their modules.' }] },
  },
)
