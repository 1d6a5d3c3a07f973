import { readLanguage, showLanguage } from '../../../src/plugins/i18n.ts'

await Promise.all([readLanguage('en'), readLanguage('es')])
showLanguage('en')
