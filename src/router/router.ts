import { createRouter, createWebHistory } from 'vue-router'
import { guard } from './guard.ts'
import { routes } from './routes.ts'

/** The places of the client and their addresses. */
export const router = createRouter({
  history: createWebHistory(),
  routes,
  scrollBehavior: (_to, _from, saved) => saved ?? { top: 0 },
})

router.beforeEach(guard)
