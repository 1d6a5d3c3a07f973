import { useQuery, useQueryClient } from '@tanstack/vue-query'
import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { meApi } from '../../api/meApi.ts'
import { useSession } from '../../stores/session.ts'
import type { SeenLine } from './seenLine.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useFigures } from '../app/useFigures.ts'
import { useTask, type Task } from '../form/useTask.ts'

/** Where one is signed in, in words, and ending one or all others. */
export function useOwnSessions(): {
  lines: ComputedRef<SeenLine[] | undefined>
  isError: ComputedRef<boolean>
  refetch: () => unknown
  end: Task<[string], unknown>
  endOthers: Task<[], unknown>
} {
  const { t } = useI18n()
  const session = useSession()
  const client = useQueryClient()
  const farm = useFarm(() => session.farmId)
  const { day } = useFigures()
  const key = computed(() => ['own-sessions', session.user?.id ?? ''])
  const query = useQuery({ queryKey: key, queryFn: () => meApi.sessions() })
  const zone = computed(() => farm.data.value?.zone ?? 'UTC')
  const moment = (instant: string): string => `${day(civilDateIn(zone.value, instant))}, ${civilTimeIn(zone.value, instant)}`
  const again = (): Promise<void> => client.invalidateQueries({ queryKey: key.value })
  return {
    lines: computed(() => query.data.value?.map(({ id, device, onSharedPhone, openedAt, seenAt, isThis }) => {
      const words = device ?? t('people.me.unknownDevice')
      const [name, last] = [onSharedPhone ? `${words}, ${t('people.me.onSharedPhone')}` : words, moment(seenAt)]
      return { id, name, first: moment(openedAt), last, note: isThis ? t('people.me.thisOne') : '', about: `${name}, ${last}` }
    })),
    isError: computed(() => query.isError.value),
    refetch: () => query.refetch(),
    end: useTask(async (id: string) => { await meApi.endSession(id); await again() }),
    endOthers: useTask(async () => { await meApi.endOthers(); await again() }),
  }
}
