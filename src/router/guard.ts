import type { NavigationGuardReturn, RouteLocationNormalized } from 'vue-router'
import { useSession } from '../stores/session.ts'

/** Who is not signed in goes to the cover and comes back; a certifier starts at My farms; a wrong role finds nothing; who has no farm makes one, or reads what was granted until lately; a farm that asks a second factor opens once there is one. */
export async function guard(to: RouteLocationNormalized): Promise<NavigationGuardReturn> {
  const session = useSession()
  // Pages for anyone ask nothing: the server would answer that nobody is signed in.
  if (to.meta.open === true) return true
  await session.load()
  if (session.user === null) return { name: 'sign-in', query: to.fullPath === '/' ? {} : { next: to.fullPath } }
  if (session.role === null) {
    const home = session.session?.hadGrants === true ? 'my-farms' : 'farm-new'
    const open: unknown[] = home === 'farm-new' ? [home] : [home, 'farm-new', 'me']
    return open.includes(to.name) || { name: home }
  }
  if (session.membership?.factorNeeded === true && to.name !== 'farm-new') return to.name === 'second-factor' ? true : { name: 'second-factor' }
  const roles = to.meta.roles
  if (roles === undefined || roles.includes(session.role)) return true
  return to.name === 'today' ? { name: 'my-farms' } : { name: 'not-found', params: { rest: to.path.slice(1).split('/') } }
}
