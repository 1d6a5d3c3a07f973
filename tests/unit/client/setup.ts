import { createPinia, setActivePinia } from 'pinia'
import { readLanguage, readLaterWords, showLanguage } from '../../../src/plugins/i18n.ts'

await Promise.all([readLanguage('en'), readLanguage('es')])
await readLaterWords()
showLanguage('en')

// jsdom has no media queries: a desk with a pointer, unless a test says otherwise.
window.matchMedia ??= (media) => ({ media, matches: false, onchange: null, addEventListener: () => undefined, removeEventListener: () => undefined, addListener: () => undefined, removeListener: () => undefined, dispatchEvent: () => false })

// Stores for components that are mounted alone; a test that is about a store makes its own.
setActivePinia(createPinia())
