import type { RouteRecordRaw } from 'vue-router'
import type { Role } from '../../shared/contract/session.ts'
import { withWords } from '../composables/app/laterPart.ts'

declare module 'vue-router' {
  interface RouteMeta {
    /** Opens without signing in. */
    open?: boolean
    /** Stands on the cover, without spine. */
    cover?: boolean
    /** Who may open it; everyone on a farm when not said. */
    roles?: Role[]
    /** The place of the spine it belongs to. */
    place?: string
    /** The page has its own row of actions where the phone's bar stands. */
    ownFoot?: boolean
  }
}

const FARM_PEOPLE: Role[] = ['owner', 'manager', 'applicator']
const MANAGERS: Role[] = ['owner', 'manager']

/** Every address; views are read when they are first opened, and the words of all screens with the first that is not on the way from sign-in to a new record. */
export const routes: RouteRecordRaw[] = [
  { path: '/signin', name: 'sign-in', component: () => import('../views/sign-in/SignInView.vue'), meta: { open: true } },
  { path: '/welcome/:token?', name: 'welcome', component: () => withWords(() => import('../views/welcome/WelcomeView.vue')), props: true, meta: { open: true } },
  { path: '/check/:code?', name: 'check', component: () => withWords(() => import('../views/check/CheckView.vue')), props: true, meta: { open: true } },
  { path: '/reset/:token?', name: 'reset', component: () => withWords(() => import('../views/reset/ResetView.vue')), props: true, meta: { open: true } },
  { path: '/', name: 'today', component: () => import('../views/today/TodayView.vue'), meta: { place: 'today', roles: FARM_PEOPLE } },
  { path: '/blocks', name: 'blocks', component: () => withWords(() => import('../views/blocks/BlocksView.vue')), meta: { place: 'blocks' } },
  { path: '/blocks/new', name: 'block-new', component: () => withWords(() => import('../views/blocks/BlockNewView.vue')), meta: { place: 'blocks', roles: MANAGERS } },
  { path: '/blocks/ground', name: 'ground', component: () => withWords(() => import('../views/blocks/GroundView.vue')), meta: { place: 'blocks' } },
  { path: '/blocks/ground/:id', name: 'ground-form', component: () => withWords(() => import('../views/blocks/GroundFormView.vue')), props: true, meta: { place: 'blocks', roles: MANAGERS } },
  { path: '/blocks/import', name: 'block-import', component: () => withWords(() => import('../views/blocks/BlockImportView.vue')), meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/merge', name: 'blocks-merge', component: () => withWords(() => import('../views/blocks/BlocksMergeView.vue')), meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id/split', name: 'block-split', component: () => withWords(() => import('../views/blocks/BlockSplitView.vue')), props: true, meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id/shape', name: 'block-shape', component: () => withWords(() => import('../views/blocks/BlockShapeView.vue')), props: true, meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id', name: 'block', component: () => withWords(() => import('../views/blocks/BlockPageView.vue')), props: true, meta: { place: 'blocks' } },
  { path: '/register', name: 'register', component: () => withWords(() => import('../views/register/RegisterView.vue')), meta: { place: 'register' } },
  { path: '/register/new', name: 'record-new', component: () => import('../views/register/RecordFormView.vue'), meta: { place: 'register', roles: FARM_PEOPLE, ownFoot: true } },
  { path: '/register/:id/amend', name: 'record-amend', component: () => withWords(() => import('../views/register/RecordAmendView.vue')), props: true, meta: { place: 'register', roles: FARM_PEOPLE, ownFoot: true } },
  { path: '/register/:id', name: 'record', component: () => withWords(() => import('../views/register/RecordView.vue')), props: true, meta: { place: 'register' } },
  { path: '/inputs', name: 'inputs', component: () => withWords(() => import('../views/inputs/InputsView.vue')), meta: { place: 'inputs' } },
  { path: '/farm', name: 'farm', component: () => withWords(() => import('../views/farm/FarmView.vue')), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/people', name: 'farm-people', component: () => withWords(() => import('../views/farm/FarmPeopleView.vue')), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/people/:id', name: 'farm-person', component: () => withWords(() => import('../views/farm/FarmPersonView.vue')), props: true, meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/me', name: 'me', component: () => withWords(() => import('../views/me/MeView.vue')) },
  { path: '/second-factor', name: 'second-factor', component: () => withWords(() => import('../views/second-factor/SecondFactorView.vue')), meta: { cover: true } },
  { path: '/farm/sprayers', name: 'farm-sprayers', component: () => withWords(() => import('../views/farm/FarmSprayersView.vue')), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/sprayers/:id', name: 'sprayer', component: () => withWords(() => import('../views/farm/SprayerView.vue')), props: true, meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/grants', name: 'farm-grants', component: () => withWords(() => import('../views/farm/FarmGrantsView.vue')), meta: { place: 'farm', roles: ['owner'] } },
  { path: '/farm/grants/:id', name: 'grant-sight', component: () => withWords(() => import('../views/farm/GrantSightView.vue')), props: true, meta: { place: 'farm', roles: ['owner'] } },
  { path: '/farm/journal', name: 'farm-journal', component: () => withWords(() => import('../views/farm/FarmJournalView.vue')), meta: { place: 'farm', roles: MANAGERS } },
  { path: '/start', name: 'start', component: () => withWords(() => import('../views/start/StartView.vue')), meta: { place: 'farm', roles: MANAGERS } },
  { path: '/farms/new', name: 'farm-new', component: () => withWords(() => import('../views/farm-new/FarmNewView.vue')), meta: { cover: true } },
  { path: '/farms', name: 'my-farms', component: () => withWords(() => import('../views/my-farms/MyFarmsView.vue')), meta: { place: 'my-farms', roles: ['certifier'] } },
  { path: '/:rest(.*)*', name: 'not-found', component: () => withWords(() => import('../views/not-found/NotFoundView.vue')) },
  { path: '/rounds', name: 'rounds', component: () => withWords(() => import('../views/rounds/RoundsView.vue')), meta: { place: 'rounds', roles: FARM_PEOPLE } },
  { path: '/rounds/plans/:id', name: 'season-plan', component: () => withWords(() => import('../views/rounds/PlanFormView.vue')), props: true, meta: { place: 'rounds', roles: MANAGERS } },
  { path: '/farm/mail', name: 'farm-mail', component: () => withWords(() => import('../views/farm/FarmMailView.vue')), meta: { place: 'farm', roles: ['owner'] } },
]
