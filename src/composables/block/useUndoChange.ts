import { useI18n } from 'vue-i18n'
import { useRouter } from 'vue-router'
import type { BlocksChanged } from '../../../shared/contract/blockChanges.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useToast } from '../app/useToast.ts'

/** Says what a cut or a join did, with the way back beside it. */
export function useUndoChange(): { tell: (words: string, farmId: string, changed: BlocksChanged) => void } {
  const { t } = useI18n()
  const { problem } = useMessages()
  const { submit } = useSubmit()
  const router = useRouter()
  const toast = useToast()

  async function undo(farmId: string, { ended }: BlocksChanged): Promise<void> {
    const [first] = ended
    if (first === undefined) return
    try {
      await submit({ kind: 'block.reopen', farmId, id: first.id, body: { revision: first.revision } })
      toast.done(t('shapes.undone', { codes: ended.map(({ code }) => code).join(', ') }))
      await router.push(ended.length === 1 ? `/blocks/${first.id}` : '/blocks')
    } catch (error) {
      toast.failed(t('shapes.undoFailed', { why: problem(error) }))
    }
  }

  return { tell: (words, farmId, changed) => { toast.withWay(words, t('shapes.undo'), () => void undo(farmId, changed)) } }
}
