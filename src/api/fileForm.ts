import type { FileKind } from '../../shared/contract/attachment.ts'

/** A photo or paper as it is sent, under an id made once. */
export function fileForm({ id, kind, name, content }: { id: string; kind: FileKind; name: string; content: Blob }): FormData {
  const form = new FormData()
  form.append('id', id)
  form.append('kind', kind)
  form.append('file', content, name)
  return form
}
