import { z } from 'zod'
import { attachmentSchema, type Attachment } from '../../shared/contract/attachment.ts'
import { fileForm } from './fileForm.ts'
import { http } from './http.ts'

/** What papers can be of, beside records. */
export type PaperHolder = { about: 'land' | 'calibration' | 'certificate'; id: string }

const listSchema = z.object({ items: z.array(attachmentSchema), next: z.null() })

function addressOf(farmId: string, holder: PaperHolder | { about: 'person-paper'; id: string }): string {
  const farm = `/farms/${farmId}`
  if (holder.about === 'land') return `${farm}/blocks/${holder.id}/papers`
  if (holder.about === 'calibration') return `${farm}/calibrations/${holder.id}/papers`
  return holder.about === 'certificate' ? `${farm}/certificates/${holder.id}/papers` : `${farm}/person-papers/${holder.id}/files`
}

/** Papers of the land of a block, of a calibration, of a certificate; those of a person come with what is written down of them. */
export const heldPaperApi = {
  list: (farmId: string, holder: PaperHolder): Promise<Attachment[]> => http.get(addressOf(farmId, holder), listSchema).then(({ items }) => items),
  add: (farmId: string, holder: Parameters<typeof addressOf>[1], { id, file }: { id: string; file: File }): Promise<Attachment> =>
    http.upload(addressOf(farmId, holder), fileForm({ id, kind: 'paper', name: file.name, content: file }), attachmentSchema, () => undefined),
}
