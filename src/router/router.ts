import { createRouter, createWebHistory } from 'vue-router'
import { overlaysSettled, watchOverlays } from '../plugins/overlayHistory.ts'
import { openNewBuild } from '../stores/newBuild.ts'
import { confirmAccess } from './confirmAccess.ts'
import { guard } from './guard.ts'
import { routes } from './routes.ts'

// Before the history is made: it listens first to what is taken back.
watchOverlays()

/** The places of the client and their addresses. */
export const router = createRouter({
  history: createWebHistory(),
  routes,
  scrollBehavior: (_to, _from, saved) => saved ?? { top: 0 },
})

router.beforeEach(overlaysSettled)
router.beforeEach(guard)
confirmAccess(router)
router.onError((_error, to) => { void openNewBuild(to.fullPath) })
