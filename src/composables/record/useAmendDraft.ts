import { ref, watch, type Ref } from 'vue'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { readKeptDraft } from './readKeptDraft.ts'
import { draftOfRecord, emptyRecord, type RecordDraft } from './recordDraft.ts'
import { useDrafts } from '../form/useDrafts.ts'

interface KeptAmendment {
  /** Of whichever version of the program wrote it. */
  typed: unknown
  reason: string
  /** What it was written over. */
  revision: number
}

/** What is typed over a signed record, kept on the device until it is signed or left. */
export interface AmendDraft {
  draft: Ref<RecordDraft>
  reason: Ref<string>
  /** Fills the form: with what was typed over this very version before, else with what stands. */
  fill: (record: ApplicationRecord, zone: string) => Promise<void>
  discard: () => Promise<void>
}

/** The form of an amendment; what was kept over a version that no longer stands is not brought back. @param id of the record. */
export function useAmendDraft(id: string): AmendDraft {
  const session = useSession()
  const preferences = usePreferences()
  const drafts = useDrafts(() => session.farmId, 'amendment')
  const key = `amend-${id}`
  const draft = ref<RecordDraft>(emptyRecord())
  const reason = ref('')
  let revision: number | null = null

  async function fill(record: ApplicationRecord, zone: string): Promise<void> {
    const kept = (await drafts.read<KeptAmendment>(key))?.content
    if (kept?.revision === record.revision) {
      draft.value = readKeptDraft(kept.typed)
      reason.value = kept.reason
    } else {
      draft.value = { ...draftOfRecord(record, zone, preferences.units), step: 2 }
    }
    revision = record.revision
  }

  async function discard(): Promise<void> {
    revision = null
    await drafts.remove(key)
  }

  // What fills the form is no typing: only what differs from it is kept.
  let shown: string | null = null
  watch([draft, reason], () => {
    if (revision === null) return
    const text = JSON.stringify([draft.value, reason.value])
    if (shown !== null && text !== shown) drafts.write(key, 'amendment', { typed: draft.value, reason: reason.value, revision } satisfies KeptAmendment)
    shown = text
  }, { deep: true })

  return { draft, reason, fill, discard }
}
