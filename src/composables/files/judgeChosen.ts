import { MOST_FILE_BYTES, type FileKind } from '../../../shared/contract/attachment.ts'
import { judgeFileType, type FileFault } from '../../../shared/files/judgeFileType.ts'
import { laterCode } from '../app/laterPart.ts'

const readTypes = laterCode(() => import('file-type/core'))

/** What is wrong with a file as it is chosen, judged by its bytes as the server will; null where nothing is. */
export async function judgeChosen(file: File, kind: FileKind): Promise<FileFault | 'too_large' | null> {
  if (file.size > MOST_FILE_BYTES) return 'too_large'
  try {
    const { fileTypeFromBuffer } = await readTypes()
    const found = (await fileTypeFromBuffer(await file.arrayBuffer()))?.mime
    const judged = judgeFileType({ name: file.name, announced: file.type, bytes: file.size, found }, kind)
    return judged.ok ? null : judged.fault
  } catch {
    // Without signal the part that reads bytes may not be here: the server judges them then.
    return null
  }
}
