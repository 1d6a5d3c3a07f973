import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { phoneApi } from '../../api/phoneApi.ts'
import { useSession } from '../../stores/session.ts'
import type { SeenLine } from './seenLine.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'
import { useFigures } from '../app/useFigures.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask, type Task } from '../form/useTask.ts'

/** The farm's shared phones in words, and taking one away; who does not lead the farm does not ask for them. */
export function usePhones(): { lines: ComputedRef<SeenLine[] | undefined>; isError: ComputedRef<boolean>; refetch: () => unknown; revoke: Task<[string], unknown> } {
  const { t } = useI18n()
  const session = useSession()
  const farm = useFarm(() => session.farmId)
  const { day } = useFigures()
  const { submit } = useSubmit()
  const query = useFarmRead('shared-phones', () => session.farmId, (id) => phoneApi.list(id), () => session.canManage)
  const dayOf = (instant: string): string => day(civilDateIn(farm.data.value?.zone ?? 'UTC', instant))
  return {
    lines: computed(() => query.data.value?.map(({ id, name, enrolledBy, enrolledAt, lastUsedAt, revokedAt }) => ({
      id, name, about: name, first: t('people.phones.by', { day: dayOf(enrolledAt), name: enrolledBy }),
      last: lastUsedAt === null ? t('people.phones.never') : dayOf(lastUsedAt),
      note: revokedAt === null ? '' : t('people.phones.revoked', { day: dayOf(revokedAt) }),
    }))),
    isError: computed(() => query.isError.value),
    refetch: () => query.refetch(),
    revoke: useTask((id: string) => submit({ kind: 'phone.revoke', farmId: session.farmId, id, body: {} })),
  }
}
