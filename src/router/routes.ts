import type { Component } from 'vue'
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

/** The views of a place come in one piece, with the words of all screens; what is picked is one of them. */
function place<Views>(load: () => Promise<Views>): (pick: (views: Views) => Component) => () => Promise<Component> {
  return (pick) => async () => pick(await withWords(load))
}
const open = place(() => import('./places/open.ts'))
const blocks = place(() => import('./places/blocks.ts'))
const register = place(() => import('./places/register.ts'))
const rounds = place(() => import('./places/rounds.ts'))
const farm = place(() => import('./places/farm.ts'))

/** Every address; views are read when they are first opened, and the words of all screens with the first that is not on the way from sign-in to a new record. */
export const routes: RouteRecordRaw[] = [
  { path: '/signin', name: 'sign-in', component: () => import('../views/sign-in/SignInView.vue'), meta: { open: true } },
  { path: '/welcome/:token?', name: 'welcome', component: open(({ WelcomeView }) => WelcomeView), props: true, meta: { open: true } },
  { path: '/check/:code?', name: 'check', component: open(({ CheckView }) => CheckView), props: true, meta: { open: true } },
  { path: '/reset/:token?', name: 'reset', component: open(({ ResetView }) => ResetView), props: true, meta: { open: true } },
  { path: '/', name: 'today', component: () => import('../views/today/TodayView.vue'), meta: { place: 'today', roles: FARM_PEOPLE } },
  { path: '/blocks', name: 'blocks', component: blocks(({ BlocksView }) => BlocksView), meta: { place: 'blocks' } },
  { path: '/blocks/new', name: 'block-new', component: blocks(({ BlockNewView }) => BlockNewView), meta: { place: 'blocks', roles: MANAGERS } },
  { path: '/blocks/ground', name: 'ground', component: blocks(({ GroundView }) => GroundView), meta: { place: 'blocks' } },
  { path: '/blocks/ground/:id', name: 'ground-form', component: blocks(({ GroundFormView }) => GroundFormView), props: true, meta: { place: 'blocks', roles: MANAGERS } },
  { path: '/blocks/import', name: 'block-import', component: blocks(({ BlockImportView }) => BlockImportView), meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/merge', name: 'blocks-merge', component: blocks(({ BlocksMergeView }) => BlocksMergeView), meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id/split', name: 'block-split', component: blocks(({ BlockSplitView }) => BlockSplitView), props: true, meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id/shape', name: 'block-shape', component: blocks(({ BlockShapeView }) => BlockShapeView), props: true, meta: { place: 'blocks', roles: MANAGERS, ownFoot: true } },
  { path: '/blocks/:id', name: 'block', component: blocks(({ BlockPageView }) => BlockPageView), props: true, meta: { place: 'blocks' } },
  { path: '/register', name: 'register', component: register(({ RegisterView }) => RegisterView), meta: { place: 'register' } },
  { path: '/register/new', name: 'record-new', component: () => import('../views/register/RecordFormView.vue'), meta: { place: 'register', roles: FARM_PEOPLE, ownFoot: true } },
  { path: '/register/:id/amend', name: 'record-amend', component: register(({ RecordAmendView }) => RecordAmendView), props: true, meta: { place: 'register', roles: FARM_PEOPLE, ownFoot: true } },
  { path: '/register/:id', name: 'record', component: register(({ RecordView }) => RecordView), props: true, meta: { place: 'register' } },
  { path: '/inputs', name: 'inputs', component: farm(({ InputsView }) => InputsView), meta: { place: 'inputs' } },
  { path: '/farm', name: 'farm', component: farm(({ FarmView }) => FarmView), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/people', name: 'farm-people', component: farm(({ FarmPeopleView }) => FarmPeopleView), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/people/:id', name: 'farm-person', component: farm(({ FarmPersonView }) => FarmPersonView), props: true, meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/me', name: 'me', component: farm(({ MeView }) => MeView) },
  { path: '/second-factor', name: 'second-factor', component: farm(({ SecondFactorView }) => SecondFactorView), meta: { cover: true } },
  { path: '/farm/sprayers', name: 'farm-sprayers', component: farm(({ FarmSprayersView }) => FarmSprayersView), meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/sprayers/:id', name: 'sprayer', component: farm(({ SprayerView }) => SprayerView), props: true, meta: { place: 'farm', roles: FARM_PEOPLE } },
  { path: '/farm/grants', name: 'farm-grants', component: farm(({ FarmGrantsView }) => FarmGrantsView), meta: { place: 'farm', roles: ['owner'] } },
  { path: '/farm/grants/:id', name: 'grant-sight', component: farm(({ GrantSightView }) => GrantSightView), props: true, meta: { place: 'farm', roles: ['owner'] } },
  { path: '/farm/journal', name: 'farm-journal', component: farm(({ FarmJournalView }) => FarmJournalView), meta: { place: 'farm', roles: MANAGERS } },
  { path: '/start', name: 'start', component: farm(({ StartView }) => StartView), meta: { place: 'farm', roles: MANAGERS } },
  { path: '/farms/new', name: 'farm-new', component: farm(({ FarmNewView }) => FarmNewView), meta: { cover: true } },
  { path: '/farms', name: 'my-farms', component: farm(({ MyFarmsView }) => MyFarmsView), meta: { place: 'my-farms', roles: ['certifier'] } },
  { path: '/:rest(.*)*', name: 'not-found', component: farm(({ NotFoundView }) => NotFoundView) },
  { path: '/rounds', name: 'rounds', component: rounds(({ RoundsView }) => RoundsView), meta: { place: 'rounds', roles: FARM_PEOPLE } },
  { path: '/rounds/plans/:id', name: 'season-plan', component: rounds(({ PlanFormView }) => PlanFormView), props: true, meta: { place: 'rounds', roles: MANAGERS } },
  { path: '/farm/mail', name: 'farm-mail', component: farm(({ FarmMailView }) => FarmMailView), meta: { place: 'farm', roles: ['owner'] } },
]
