import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Place } from '../../components/page/places.ts'
import { useSession } from '../../stores/session.ts'
import { useJobsWaiting } from '../rounds/useJobsWaiting.ts'

const OF_FARM: Omit<Place, 'words'>[] = [
  { name: 'today', to: '/', icon: 'today' },
  { name: 'blocks', to: '/blocks', icon: 'blocks' },
  { name: 'register', to: '/register', icon: 'register' },
  { name: 'inputs', to: '/inputs', icon: 'inputs' },
  { name: 'rounds', to: '/rounds', icon: 'rounds' },
  { name: 'farm', to: '/farm', icon: 'farm' },
]
const OF_CERTIFIER: Omit<Place, 'words'>[] = [
  { name: 'my-farms', to: '/farms', icon: 'farms' },
  { name: 'blocks', to: '/blocks', icon: 'blocks' },
  { name: 'register', to: '/register', icon: 'register' },
  { name: 'inputs', to: '/inputs', icon: 'inputs' },
]

/** Places that say how many jobs wait, due and late. */
const WITH_JOBS = ['today', 'rounds']

/** The places of the spine for the role on the open farm. */
export function usePlaces(): ComputedRef<Place[]> {
  const session = useSession()
  const { t } = useI18n()
  const waiting = useJobsWaiting()
  return computed(() => {
    const count = waiting.data.value?.length ?? 0
    const places = session.role === null ? OF_CERTIFIER.slice(0, 1) : session.role === 'certifier' ? OF_CERTIFIER : OF_FARM
    return places.map((place) => ({ ...place, words: t(`frame.places.${place.name}`), ...(WITH_JOBS.includes(place.name) && { count }) }))
  })
}
