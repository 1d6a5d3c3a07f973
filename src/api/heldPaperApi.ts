import { z } from 'zod'
import { attachmentSchema, type Attachment } from '../../shared/contract/attachment.ts'
import { http } from './http.ts'

/** What papers can be of, beside records and people. */
export type PaperHolder = { about: 'land' | 'calibration'; id: string } | { about: 'certificate' }

const listSchema = z.object({ items: z.array(attachmentSchema), next: z.null() })
const PLACES = { land: 'blocks', calibration: 'calibrations' } as const

const addressOf = (farmId: string, holder: PaperHolder): string =>
  holder.about === 'certificate' ? `/farms/${farmId}/certificate/papers` : `/farms/${farmId}/${PLACES[holder.about]}/${holder.id}/papers`

/** Papers of the land of a block, of a calibration, of the farm's certificate. */
export const heldPaperApi = {
  list: (farmId: string, holder: PaperHolder): Promise<Attachment[]> => http.get(addressOf(farmId, holder), listSchema).then(({ items }) => items),
  add: (farmId: string, holder: PaperHolder, { id, file }: { id: string; file: File }): Promise<Attachment> => {
    const form = new FormData()
    form.append('id', id)
    form.append('kind', 'paper')
    form.append('file', file, file.name)
    return http.upload(addressOf(farmId, holder), form, attachmentSchema, () => undefined)
  },
}
