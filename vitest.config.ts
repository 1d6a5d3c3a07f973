import vue from '@vitejs/plugin-vue'
import { defineConfig, type TestProjectInlineConfiguration } from 'vitest/config'

const ofClient: TestProjectInlineConfiguration['test'] = {
  environment: 'jsdom',
  setupFiles: ['tests/unit/client/setup.ts'],
  // its modules import their own .css, which Node.js cannot
  server: { deps: { inline: ['element-plus'] } },
  testTimeout: 30_000,
}

export default defineConfig({
  test: {
    // One word for each kind of test: `npm test -- --only …` names them.
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          // Nothing here replaces a module: each is read once a worker, not once a file.
          isolate: false,
          include: ['tests/{unit,reference,house,cli}/**/*.test.ts'],
          exclude: ['tests/unit/client/**'],
          setupFiles: ['shared/messages/everyLanguage.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      { plugins: [vue()], test: { name: 'client', include: ['tests/unit/client/**/*.test.ts'], exclude: ['**/*.mocked.test.ts'], isolate: false, ...ofClient } },
      // A module that a file replaces is replaced for that file alone.
      { plugins: [vue()], test: { name: 'mocked', include: ['tests/unit/client/**/*.mocked.test.ts'], ...ofClient } },
      {
        test: {
          name: 'api',
          environment: 'node',
          isolate: false,
          include: ['tests/api/**/*.test.ts'],
          globalSetup: ['tests/support/globalSetup.ts'],
          setupFiles: ['shared/messages/everyLanguage.ts'],
          maxWorkers: 2,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
    ],
    allowOnly: false,
  },
})
