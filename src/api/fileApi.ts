import { z } from 'zod'
import { attachmentSchema, type Attachment, type FileKind } from '../../shared/contract/attachment.ts'
import { fileForm } from './fileForm.ts'
import { http } from './http.ts'

const listSchema = z.object({ items: z.array(attachmentSchema), next: z.null() })

/** A photo or paper to be sent. */
export interface FileToSend {
  id: string
  farmId: string
  recordId: string
  kind: FileKind
  name: string
  content: Blob
}

/** Photos and papers of records. */
export const fileApi = {
  list: (farmId: string, recordId: string): Promise<z.infer<typeof listSchema>> => http.get(`/farms/${farmId}/records/${recordId}/files`, listSchema),
  add: ({ farmId, recordId, ...file }: FileToSend, onProgress: (share: number) => void): Promise<Attachment> =>
    http.upload(`/farms/${farmId}/records/${recordId}/files`, fileForm(file), attachmentSchema, onProgress),
  remove: (farmId: string, id: string): Promise<undefined> => http.del(`/farms/${farmId}/files/${id}`, z.undefined()),
  /** Where a browser finds it: as it is shown, small for a list, or as it came in. */
  address: (farmId: string, id: string, how: 'shown' | 'small' | 'original' = 'shown'): string =>
    `/api/farms/${farmId}/files/${id}${how === 'small' ? '?size=small' : how === 'original' ? '?original=1' : ''}`,
}
