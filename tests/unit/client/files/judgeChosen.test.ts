import { describe, expect, it } from 'vitest'
import { MOST_FILE_BYTES } from '../../../../shared/contract/attachment.ts'
import { judgeChosen } from '../../../../src/composables/files/judgeChosen.ts'
import { buildHeic, buildPicture } from '../../../support/buildFiles.ts'

const chosen = (bytes: BlobPart, name = 'leaf.jpg', type = 'image/jpeg'): File => new File([bytes], name, { type })
const read = (bytes: Buffer): Uint8Array<ArrayBuffer> => new Uint8Array(bytes)

describe('a chosen file', () => {
  it('is taken when its bytes are what its name says', async () => {
    expect(await judgeChosen(chosen(read(await buildPicture('jpeg'))), 'photo')).toBeNull()
    expect(await judgeChosen(chosen(read(await buildPicture('webp')), 'leaf.webp', 'image/webp'), 'photo')).toBeNull()
  })

  it('is refused for its bytes, whatever its name says', async () => {
    expect(await judgeChosen(chosen('only words, and enough of them to read'), 'photo')).toBe('type')
    expect(await judgeChosen(chosen(read(await buildPicture('png'))), 'photo')).toBe('name_differs')
    expect(await judgeChosen(chosen(read(buildHeic())), 'photo')).toBe('camera_only')
    expect(await judgeChosen(chosen(''), 'photo')).toBe('empty')
  })

  it('is refused for its size before it is read', async () => {
    const file = chosen('x')
    Object.defineProperty(file, 'size', { value: MOST_FILE_BYTES + 1 })
    expect(await judgeChosen(file, 'photo')).toBe('too_large')
  })
})
