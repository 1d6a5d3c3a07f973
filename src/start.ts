import { VueQueryPlugin } from '@tanstack/vue-query'
import { localeContextKey } from 'element-plus/es/hooks/use-locale/index'
import { createPinia } from 'pinia'
import { createApp } from 'vue'
import App from './App.vue'
import { onSessionEnd } from './api/http.ts'
import { controlWords, i18n } from './plugins/i18n.ts'
import { queryClient } from './plugins/queryClient.ts'
import { readViewsWhenIdle } from './router/readViews.ts'
import { router } from './router/router.ts'
import { useFileQueue } from './stores/fileQueue.ts'
import { useOutbox } from './stores/outbox.ts'
import { usePreferences } from './stores/preferences.ts'
import { useReentry } from './stores/reentry.ts'
import { useSession } from './stores/session.ts'
import './styles/fonts.ts'
import './styles/element.ts'
import './styles/styles.ts'

const app = createApp(App)
app.use(createPinia()).use(i18n).use(VueQueryPlugin, { queryClient })
// What the controls say of themselves, in the language shown.
app.provide(localeContextKey, controlWords)

const words = usePreferences().start()
useOutbox().start()
useFileQueue().start()
// A session that ends while nobody is signed in here is no question to anyone.
onSessionEnd(() => (useSession().user === null ? Promise.resolve(false) : useReentry().ask()))

readViewsWhenIdle(router)
// The first page is on its way while the words are read.
app.use(router)
await words
app.mount('#app')
