import { useQuery } from '@tanstack/vue-query'
import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Attachment, FileKind } from '../../../shared/contract/attachment.ts'
import { fileLabel } from '../../../shared/files/fileLabel.ts'
import { fileApi } from '../../api/fileApi.ts'
import { queryClient } from '../../plugins/queryClient.ts'
import { useFileQueue } from '../../stores/fileQueue.ts'
import type { FileLine } from '../files/fileLine.ts'
import { judgeChosen } from '../files/judgeChosen.ts'
import { newId } from '../form/newId.ts'
import { useFileLines } from '../files/useFileLines.ts'
import { useMessages } from '../app/useMessages.ts'

interface RecordFilesOptions {
  farmId: () => string
  recordId: () => string
  zone: () => string
  /** Whether the server has the record: without it files stay on this device. */
  isThere: () => boolean
  isSigned: () => boolean
}

export interface RecordFiles {
  lines: ComputedRef<FileLine[]>
  /** What could not be taken or done, in words; empty where all went well. */
  faults: Ref<string[]>
  /** What was done last, for a reader that speaks. */
  said: Ref<string>
  /** Why the list did not come; empty where it did. */
  listFault: ComputedRef<string>
  again: () => void
  add: (kind: FileKind, files: File[]) => Promise<void>
  remove: (line: FileLine) => Promise<void>
  retry: (id: string) => Promise<void>
}

/** The photos and papers of one record: seen, added, sent again, taken back. */
export function useRecordFiles({ farmId, recordId, zone, isThere, isSigned }: RecordFilesOptions): RecordFiles {
  const { t } = useI18n()
  const { problem } = useMessages()
  const queue = useFileQueue()
  const faults = ref<string[]>([])
  const said = ref('')
  const queryKey = ['files', computed(farmId), computed(recordId)] as const
  const list = useQuery({
    queryKey,
    enabled: () => farmId() !== '' && recordId() !== '' && isThere(),
    queryFn: async (): Promise<Attachment[]> => (await fileApi.list(farmId(), recordId())).items,
  })
  const lines = useFileLines({ farmId, recordId, zone, isSigned, list: list.data })

  async function add(kind: FileKind, files: File[]): Promise<void> {
    const judged = await Promise.all(files.map(async (file) => ({ file, fault: await judgeChosen(file, kind) })))
    faults.value = judged.flatMap(({ file, fault }) => (fault === null ? [] : [`${file.name}: ${t(`problems.file.${fault}`)}`]))
    const taken = judged.filter(({ fault }) => fault === null).map(({ file }) => file)
    if (taken.length === 0) return
    const sent = taken.map((file) => ({ id: newId(), farmId: farmId(), recordId: recordId(), kind, name: fileLabel(file.name, t(`files.kind.${kind}`)), content: file }))
    const hasRoom = await queue.add(sent, isThere())
    if (!hasRoom) faults.value = [...faults.value, t('files.noRoom')]
    said.value = t('files.added', { names: taken.map(({ name }) => name).join(', ') })
  }

  async function remove(line: FileLine): Promise<void> {
    faults.value = []
    try {
      // It may have arrived since it was drawn here: asked for as it stands now.
      const isComing = queue.items.some(({ id }) => id === line.id)
      if (isComing) await queue.discard(line.id)
      if (!isComing || list.data.value?.some(({ id }) => id === line.id)) await fileApi.remove(farmId(), line.id)
      said.value = t('files.removed', { name: line.label })
    } catch (error) {
      faults.value = [`${line.label}: ${problem(error)}`]
    }
    await queryClient.invalidateQueries({ queryKey: ['files', farmId(), recordId()] })
  }

  return {
    lines, faults, said, add, remove,
    listFault: computed(() => (list.error.value === null ? '' : problem(list.error.value))),
    again: () => void list.refetch(),
    retry: (id) => queue.retry(id),
  }
}
