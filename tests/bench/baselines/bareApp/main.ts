import { ElButton } from 'element-plus'
import { createApp, h } from 'vue'
import { createRouter, createWebHistory, RouterView } from 'vue-router'

// The least that is a page of the same libraries: Vue, its router, and one button.
const Page = { render: () => h(ElButton, () => 'One') }
const router = createRouter({ history: createWebHistory(), routes: [{ path: '/', component: Page }] })
createApp({ render: () => h(RouterView) }).use(router).mount('#app')
