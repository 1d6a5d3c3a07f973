import { computed, onScopeDispose, ref, shallowRef, toValue, watch, type MaybeRefOrGetter, type Ref, type ShallowRef } from 'vue'
import { device, watchDrafts } from '../../plugins/device.ts'
import type { Draft, DraftKind } from '../../stores/draftTypes.ts'
import { draftWriter } from '../../stores/draftWriter.ts'
import { useSession } from '../../stores/session.ts'

/** Drafts of one farm on this device, of the account that is signed in, newest first. */
export interface Drafts {
  drafts: Readonly<ShallowRef<Draft[]>>
  /** False until the device has answered once. */
  ready: Readonly<Ref<boolean>>
  /** The draft of that id if it is this account's, else null. */
  read: <Content>(id: string) => Promise<Draft<Content> | null>
  /** Keeps the whole content as it stands; call at every keystroke, a copy is made at once and the database has it within 150 ms. */
  write: (id: string, kind: DraftKind, content: unknown) => void
  /** Writes what still waits. */
  flush: () => Promise<void>
  remove: (id: string) => Promise<void>
  /** Calls back with the draft of that id when another tab has written it and nothing typed here waits; ends with the scope. */
  onTakenOver: <Content>(id: MaybeRefOrGetter<string>, take: (draft: Draft<Content>) => void) => void
}

/** Drafts survive a reload and signing out; they leave only by `remove`. */
export function useDrafts(farmId: MaybeRefOrGetter<string>, kind?: DraftKind): Drafts {
  const session = useSession()
  const drafts = shallowRef<Draft[]>([])
  const ready = ref(false)
  const owner = computed(() => ({ accountId: session.user?.id ?? '', farmId: toValue(farmId) }))

  const stop = watch(owner, ({ accountId, farmId: farm }, _before, onCleanup) => {
    let latest = 0
    let isOver = false
    async function list(): Promise<void> {
      const mine = ++latest
      const found = await listDrafts(accountId, farm, kind).catch(() => [])
      if (isOver || mine !== latest) return
      drafts.value = found
      ready.value = true
    }
    const stopWatching = watchDrafts(() => void list())
    // What was typed last before a reload is listed too.
    draftWriter.recover().then(list, list)
    onCleanup(() => { isOver = true; stopWatching() })
  }, { immediate: true })
  onScopeDispose(stop)

  async function read<Content>(id: string): Promise<Draft<Content> | null> {
    await draftWriter.flush()
    await draftWriter.recover()
    const found = await device.drafts.get(id)
    if (found !== undefined) draftWriter.saw(found)
    return found !== undefined && found.accountId === owner.value.accountId ? (found as Draft<Content>) : null
  }

  function onTakenOver<Content>(followed: MaybeRefOrGetter<string>, take: (draft: Draft<Content>) => void): void {
    async function takeOver(id: string): Promise<void> {
      if (draftWriter.isWaiting(id)) return
      const found = await read<Content>(id)
      if (found !== null && !draftWriter.isWaiting(id) && id === toValue(followed)) take(found)
    }
    onScopeDispose(draftWriter.listen((written) => { if (written.id === toValue(followed)) void takeOver(written.id) }))
  }

  return {
    drafts,
    onTakenOver,
    ready,
    read,
    write: (id, of, content) => { draftWriter.write({ id, kind: of, content, ...owner.value }) },
    flush: () => draftWriter.flush(),
    remove: (id) => draftWriter.remove(id),
  }
}

async function listDrafts(accountId: string, farmId: string, kind: DraftKind | undefined): Promise<Draft[]> {
  const kept = await device.drafts.all()
  const found = kept.filter((draft) => draft.accountId === accountId && draft.farmId === farmId)
  found.forEach(draftWriter.saw)
  return found
    .filter((draft) => kind === undefined || draft.kind === kind)
    .sort((one, other) => other.updatedAt.localeCompare(one.updatedAt))
}
