import { describe, expect, it } from 'vitest'
import { judgeFileType, type SeenFile } from '../../../shared/files/judgeFileType.ts'

const seen = (overrides: Partial<SeenFile> = {}): SeenFile => ({ name: 'leaf.jpg', announced: 'image/jpeg', bytes: 1200, found: 'image/jpeg', ...overrides })

describe('judgeFileType', () => {
  it.each([
    ['a picture by its bytes', seen(), 'image/jpeg'],
    ['whatever case its ending is in', seen({ name: 'LEAF.JPEG' }), 'image/jpeg'],
    ['without a name or a type of its own', seen({ name: '', announced: '', found: 'image/webp' }), 'image/webp'],
    ['announced as no more than bytes', seen({ name: 'a.png', announced: 'application/octet-stream', found: 'image/png' }), 'image/png'],
  ])('takes %s', (_what, file, type) => {
    expect(judgeFileType(file, 'photo')).toEqual({ ok: true, type })
  })

  it.each([
    ['empty', seen({ bytes: 0 })],
    ['type', seen({ found: undefined })],
    ['type', seen({ name: 'a.zip', announced: 'application/zip', found: 'application/zip' })],
    ['camera_only', seen({ name: 'IMG_1.HEIC', announced: 'image/heic', found: 'image/heic' })],
    ['camera_only', seen({ name: 'IMG_1.jpg', found: 'image/heic' })],
    ['camera_only', seen({ name: 'IMG_1.NEF', announced: '', found: undefined })],
    ['name_differs', seen({ name: 'leaf.png' })],
    ['name_differs', seen({ announced: 'text/html' })],
    ['photo_type', seen({ name: 'label.pdf', announced: 'application/pdf', found: 'application/pdf' })],
  ])('says %s of %j', (fault, file) => {
    expect(judgeFileType(file, 'photo')).toEqual({ ok: false, fault })
  })

  it('takes a PDF as a paper', () => {
    expect(judgeFileType(seen({ name: 'label.pdf', announced: 'application/pdf', found: 'application/pdf' }), 'paper')).toEqual({ ok: true, type: 'application/pdf' })
  })
})
