import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vite'
import { leaveOut } from './vite/leaveOut.ts'
import { cutPieces } from './vite/pieces.ts'

/** Where the server answers while the client is served by Vite. */
const apiUrl = process.env['API_URL'] ?? 'http://127.0.0.1:3000'

export default defineConfig({
  plugins: [vue(), leaveOut()],
  // vue-i18n: messages are made ready by compileWords; its own compiler stays out. Nothing of ours uses the options API.
  define: {
    __VUE_OPTIONS_API__: false,
    __VUE_I18N_FULL_INSTALL__: false,
    __VUE_I18N_LEGACY_API__: false,
    __INTLIFY_JIT_COMPILATION__: true,
    __INTLIFY_DROP_MESSAGE_COMPILER__: true,
    __INTLIFY_PROD_DEVTOOLS__: false,
  },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    // Nothing becomes a data: address, which the content security policy refuses.
    assetsInlineLimit: 0,
    rolldownOptions: {
      output: {
        codeSplitting: { groups: cutPieces() },
        // A shared piece would be named after all that share it.
        chunkFileNames: ({ name }) => `assets/${name.split('~')[0] ?? name}-[hash].js`,
      },
    },
    // Every browser that runs this knows how to read modules ahead.
    modulePreload: { polyfill: false },
  },
  server: {
    proxy: { '/api': apiUrl, '/dev': apiUrl },
    // A build or the database beside it is no change of the client.
    watch: { ignored: ['**/dist/**', '**/.data/**', '**/test-results/**'] },
  },
  preview: { proxy: { '/api': apiUrl, '/dev': apiUrl } },
})
