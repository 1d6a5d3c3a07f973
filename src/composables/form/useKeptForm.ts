import { ref, shallowRef, watch, type Ref, type ShallowRef } from 'vue'
import type { DraftKind } from '../../stores/draftTypes.ts'
import { useSession } from '../../stores/session.ts'
import { useDrafts } from './useDrafts.ts'

/** A form kept on the device at every change; it survives a reload and leaves when it is sent or given up. */
export interface KeptForm<Content> {
  content: ShallowRef<Content>
  /** False until the device, and what the form is about, have both answered. */
  ready: Ref<boolean>
  /** True when it was begun earlier. */
  resumed: Ref<boolean>
  /** Forgets what was done and begins anew. */
  discard: () => Promise<void>
}

interface Keeping<Content> {
  farmId: Ref<string>
  kind: DraftKind
  /** What the form is about; null until that is known. */
  about: () => string | null
  /** The content with nothing done yet; null until what it rests on is read. */
  fresh: () => Content | null
  /** Whether anything was done that would be missed. */
  isBegun: (content: Content) => boolean
}

/** @param empty what stands there until it is ready. */
export function useKeptForm<Content>(empty: Content, { farmId, kind, about, fresh, isBegun }: Keeping<Content>): KeptForm<Content> {
  const session = useSession()
  const drafts = useDrafts(farmId, kind)
  const content: ShallowRef<Content> = shallowRef(empty)
  const ready = ref(false)
  const resumed = ref(false)
  const draftId = (): string => `${kind}:${session.user?.id ?? ''}:${about() ?? ''}`

  watch([about, fresh, drafts.ready] as const, ([subject, from, isListed]) => {
    if (subject === null || from === null || !isListed) return
    if (ready.value) {
      // What it rests on has changed, and nothing was done over it yet.
      if (!isBegun(content.value)) content.value = from
      return
    }
    const kept = drafts.drafts.value.find(({ id }) => id === draftId())
    resumed.value = kept !== undefined
    ready.value = true
    if (kept !== undefined) content.value = kept.content as Content
    // A hand is faster than a slow device: what it did over the same beginning stays.
    else if (from === empty && isBegun(content.value)) drafts.write(draftId(), kind, content.value)
    else content.value = from
  }, { immediate: true })

  watch(content, (value) => {
    if (!ready.value) return
    if (isBegun(value)) drafts.write(draftId(), kind, value)
    else void drafts.remove(draftId())
  })

  return {
    content, ready, resumed,
    discard: async () => {
      await drafts.remove(draftId())
      resumed.value = false
      const from = fresh()
      if (from !== null) content.value = from
    },
  }
}
