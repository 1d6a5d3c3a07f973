import { computed, ref, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { FrameContext } from '../../components/page/frameContext.ts'
import type { SyncState } from '../../components/marks/syncState.ts'
import { civilTimeIn } from '../../../shared/time/civilDate.ts'
import { useFileQueue } from '../../stores/fileQueue.ts'
import { useOutbox } from '../../stores/outbox.ts'
import { useSession } from '../../stores/session.ts'
import { useDrafts } from '../form/useDrafts.ts'
import { useFarm } from '../farm/useFarm.ts'

/** What every page's head shows, from the session, the farm and the outbox; with the two sheets it can open. */
export function useFrameContext(): { frame: FrameContext; keptOpen: Ref<boolean>; moreOpen: Ref<boolean> } {
  const session = useSession()
  const outbox = useOutbox()
  const files = useFileQueue()
  const farm = useFarm(() => session.farmId)
  const { drafts } = useDrafts(() => session.farmId)
  const { t } = useI18n()
  const keptOpen = ref(false)
  const moreOpen = ref(false)

  const sync = computed<SyncState>(() => {
    const [kept, waiting, sending] = [outbox.kept.length + files.kept.length, outbox.needsYou.length + files.needsYou.length, outbox.sendingCount + files.sendingCount]
    if (waiting > 0) return { kind: 'needsYou', count: waiting }
    if (sending > 0) return { kind: 'sending', count: sending, of: Math.max(kept, sending) }
    if (kept > 0 || !outbox.online) return { kind: 'kept', count: kept, online: outbox.online }
    return { kind: 'sent', drafts: drafts.value.length, at: outbox.lastSentAt === null ? null : civilTimeIn(farm.data.value?.zone ?? 'UTC', outbox.lastSentAt) }
  })

  const frame: FrameContext = {
    farmName: computed(() => session.membership?.farmName ?? ''),
    season: computed(() => farm.data.value?.currentSeason ?? null),
    practice: computed(() => farm.data.value?.practice === true),
    farms: computed(() => session.memberships.map((each) => ({ id: each.farmId, name: each.farmName }))),
    farmId: computed(() => session.farmId),
    sync,
    person: computed(() =>
      session.user === null || session.role === null
        ? (session.user?.name ?? '')
        : t('frame.person', { name: session.user.name, role: t(`session.role.${session.role}`).toLowerCase() }),
    ),
    chooseFarm: session.chooseFarm,
    openKept: () => { keptOpen.value = true },
    openMore: () => { moreOpen.value = true },
  }
  return { frame, keptOpen, moreOpen }
}
