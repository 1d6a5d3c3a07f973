import { computed, onScopeDispose, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Attachment, FileKind } from '../../../shared/contract/attachment.ts'
import { fileSize } from '../../../shared/files/fileSize.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { fileApi } from '../../api/fileApi.ts'
import { useFileQueue } from '../../stores/fileQueue.ts'
import type { KeptFile } from '../../stores/keptFile.ts'
import { useSession } from '../../stores/session.ts'
import type { FileLine } from './fileLine.ts'
import { useFigures } from '../app/useFigures.ts'

interface FileLinesOptions {
  farmId: () => string
  recordId: () => string
  zone: () => string
  isSigned: () => boolean
  list: Ref<Attachment[] | undefined>
}

/** The photos and papers of a record in words, those in it first, then those on their way. */
export function useFileLines({ farmId, recordId, zone, isSigned, list }: FileLinesOptions): ComputedRef<FileLine[]> {
  const { t } = useI18n()
  const { plain, dayShort } = useFigures()
  const queue = useFileQueue()
  const session = useSession()
  const pictureOf = useObjectUrls()

  function whatOf(kind: FileKind, bytes: number): string {
    const { value, unit } = fileSize(bytes)
    return `${t(`files.kind.${kind}`)}, ${plain(value)}\u00A0${unit}`
  }

  function markOf({ signedVersion }: Attachment): string {
    if (!isSigned()) return ''
    if (signedVersion === null) return t('files.afterSignature')
    return signedVersion > 1 ? t('files.sinceVersion', { version: signedVersion }) : ''
  }

  function lineOfStored(file: Attachment): FileLine {
    const { id, kind, label, type, bytes, uploadedBy, uploadedAt, signedVersion } = file
    const isPdf = type === 'application/pdf'
    const isTheirs = uploadedBy.id === session.membership?.personId
    return {
      id, kind, label, isPdf,
      what: whatOf(kind, bytes),
      who: `${uploadedBy.name}, ${dayShort(civilDateIn(zone(), uploadedAt))}, ${civilTimeIn(zone(), uploadedAt)}`,
      picture: isPdf ? '' : fileApi.address(farmId(), id, 'small'),
      shown: fileApi.address(farmId(), id),
      original: isPdf || !(session.canManage || isTheirs) ? '' : fileApi.address(farmId(), id, 'original'),
      mark: markOf(file),
      state: 'there', percent: 100, problem: '',
      mayRemove: session.canRecord && signedVersion === null,
    }
  }

  function lineOfKept({ id, kind, name, content, state, problem, recordSeen }: KeptFile): FileLine {
    const share = queue.progress[id]
    const isPdf = content.type === 'application/pdf'
    return {
      id, kind, label: name, isPdf,
      what: whatOf(kind, content.size),
      who: '', shown: '', original: '', mark: '',
      picture: isPdf ? '' : pictureOf(id, content),
      state: state === 'needsYou' ? 'refused' : share === undefined ? 'waits' : 'sending',
      percent: Math.round((share ?? 0) * 100),
      problem: problem?.detail ?? (share !== undefined ? '' : t(recordSeen ? 'files.waits' : 'files.waitsForRecord')),
      mayRemove: true,
    }
  }

  return computed(() => {
    const stored = (list.value ?? []).map(lineOfStored)
    const there = new Set(stored.map(({ id }) => id))
    const coming = queue.items.filter((item) => item.recordId === recordId() && !there.has(item.id))
    return [...stored, ...coming.map(lineOfKept)]
  })
}

/** Addresses of pictures that are only on this device; given back when the page is left. */
function useObjectUrls(): (id: string, content: Blob) => string {
  const urls = new Map<string, string>()
  onScopeDispose(() => { for (const url of urls.values()) URL.revokeObjectURL(url) })
  return (id, content) => {
    const url = urls.get(id) ?? URL.createObjectURL(content)
    urls.set(id, url)
    return url
  }
}
