import { computed, type ComputedRef } from 'vue'
import { dueSoon, type DueThing } from '../../../shared/today/dueSoon.ts'
import { certifiedUntil } from '../../../shared/season/certificateRuns.ts'
import { useSession } from '../../stores/session.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { usePersonPapers } from '../people/usePersonPapers.ts'
import { useRegisterTotals } from '../register/useRegisterTotals.ts'
import { useSprayers } from '../farm/useSprayers.ts'

/** What of the farm's papers and sprayers ends or falls due soon; an applicator sees the sprayers and their own papers. */
export function useDueSoon(): { things: ComputedRef<DueThing[]>; hrefOf: (thing: DueThing) => string } {
  const session = useSession()
  const { today } = useFarmDay()
  const { data: farm } = useFarm(() => session.farmId)
  const { data: sprayers } = useSprayers(() => session.farmId)
  const { data: papers } = usePersonPapers(() => session.farmId)
  const readable = computed(() => (papers.value ?? []).filter(({ person }) => session.canManage || person.id === session.membership?.personId))
  return {
    things: computed(() => (today.value === null ? [] : dueSoon({
      today: today.value,
      certificate: session.canManage ? certifiedUntil(farm.value?.certificates ?? [], today.value) : null,
      sprayers: sprayers.value ?? [],
      papers: readable.value,
    }))),
    hrefOf: ({ kind, id }) => {
      if (kind === 'certificate') return '/farm'
      if (kind === 'calibration' || kind === 'uncalibrated') return `/farm/sprayers/${id}`
      return `/farm/people/${readable.value.find((paper) => paper.id === id)?.person.id ?? ''}`
    },
  }
}

/** How many signed records wait for a review; null until it is known. Asked for a season's leaders alone. */
export function useToReview(): ComputedRef<number | null> {
  const session = useSession()
  const { data } = useRegisterTotals(() => (session.canManage ? session.farmId : ''), { state: 'signed', review: 'waiting' })
  return computed(() => data.value?.records ?? null)
}
