import { createHash } from 'node:crypto'
import { readdir, rename, rm, writeFile } from 'node:fs/promises'
import type { AddressInfo } from 'node:net'
import { connect } from 'node:net'
import { createServer, type Server } from 'node:http'
import { join } from 'node:path'
import exifReader from 'exif-reader'
import sharp from 'sharp'
import supertest, { type Response } from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { drawPaper, drawPhoto } from '../../server/demo/drawFiles.ts'
import { Attachment } from '../../server/entities/Attachment.ts'
import { buildHeic, buildHugePng, buildPhonePhoto, buildPicture } from '../support/buildFiles.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

const QUOTA = 40_000_000
const MB = 1024 * 1024

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let applicator: Agent
let manager: Agent
let recordId: string

beforeAll(async () => {
  house = await openHouse()
  house.services.config.files.quotaBytes = QUOTA
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  applicator = await house.as(farm.accounts.applicator)
  manager = await house.as(farm.accounts.manager)
  recordId = await draft(applicator)
})
afterAll(() => house.close())

async function draft(agent: Agent, of: { farm: TestFarm; things: SeededThings } = { farm, things }): Promise<string> {
  const input = buildRecord({ ...of.things, lotId: null })
  await agent.post(`/api/farms/${of.farm.id}/records`).send(input).expect(201)
  return input.id
}

interface Sent { id?: string; kind?: string; name?: string; announced?: string; to?: string; by?: Agent }

/** Sends a file as a browser does. */
function send(bytes: Buffer, { id = uuidV7(), kind = 'photo', name = 'leaf.jpg', announced, to = recordId, by = applicator }: Sent = {}): Promise<Response> {
  const options = announced === undefined ? { filename: name } : { filename: name, contentType: announced }
  return by.post(`/api/farms/${farm.id}/records/${to}/files`).field({ id, kind }).attach('file', bytes, options)
}

const codesOf = ({ body }: Response): string[] => (body.errors as { code: string }[]).map(({ code }) => code)
const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')

/** What the farm has: rows of the table and names in the store's folder. */
async function countAll(): Promise<{ rows: number; kept: string[] }> {
  const rows = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (db) => db.countBy(Attachment, { farmId: farm.id }))
  const kept = await readdir(join(house.services.config.files.folder, farm.id)).catch(() => [])
  return { rows, kept: kept.sort() }
}

describe('a photo', () => {
  it('is taken in, listed, shown re-encoded and kept as it came', async () => {
    const original = await drawPhoto()
    const made = await send(original, { name: 'Feld-Ärger Lāʻī.jpg' })
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({
      recordId, kind: 'photo', label: 'Feld-Ärger Lāʻī.jpg', type: 'image/jpeg', bytes: original.length, digest: sha256(original),
      served: { width: 1600, height: 1200 }, takenAt: null, signedVersion: null, removedAt: null, uploadedBy: { id: farm.personIds.applicator },
    })
    const list = await manager.get(`/api/farms/${farm.id}/records/${recordId}/files`).expect(200)
    expect(list.body).toEqual({ items: [made.body], next: null })
    const shown = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).expect(200)
    expect(sha256(shown.body as Buffer)).toBe(made.body.served.digest)
    expect(shown.headers).toMatchObject({
      'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff', 'cache-control': 'private, no-cache',
      'content-security-policy': "default-src 'none'; sandbox", 'cross-origin-resource-policy': 'same-origin',
    })
    expect(shown.headers['content-disposition']).toMatch(/^attachment; filename="[^"]*"; filename\*=UTF-8''Feld-%C3%84rger%20L%C4%81%CA%BB%C4%AB\.jpg$/)
    const kept = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}?original=1`).expect(200)
    expect(sha256(kept.body as Buffer)).toBe(made.body.digest)
    const small = await sharp((await manager.get(`/api/farms/${farm.id}/files/${made.body.id}?size=small`).expect(200)).body as Buffer).metadata()
    expect([small.width, small.height]).toEqual([360, 270])
    const again = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).set('If-None-Match', String(shown.headers['etag']))
    expect(again.status).toBe(304)
  })

  it('is made once, whatever is sent again', async () => {
    const [bytes, id] = [await buildPicture('png'), uuidV7()]
    const first = await send(bytes, { id, name: 'a.png' })
    const again = await send(bytes, { id, name: 'a.png' })
    expect([first.status, again.status]).toEqual([201, 200])
    expect(again.body).toEqual(first.body)
    const other = await send(await buildPicture('png', { colour: '#123456' }), { id, name: 'a.png' })
    expect([other.status, codesOf(other)]).toEqual([422, ['idempotency.mismatch']])
    const both = await Promise.all([1, 2].map(() => send(bytes, { id: '0197f3a0-0000-7000-8000-00000000abcd', name: 'a.png' })))
    expect(both.map(({ status }) => status).sort()).toEqual([200, 201])
  })

  it('takes WebP too, and no other field', async () => {
    expect((await send(await buildPicture('webp'), { name: 'a.webp' })).status).toBe(201)
    const more = await applicator.post(`/api/farms/${farm.id}/records/${recordId}/files`).field({ id: uuidV7(), kind: 'photo', farmId: farm.id }).attach('file', await buildPicture(), 'a.jpg')
    expect([more.status, codesOf(more)]).toEqual([422, ['unknown_field']])
    const none = await applicator.post(`/api/farms/${farm.id}/records/${recordId}/files`).field({ id: uuidV7(), kind: 'photo' })
    expect([none.status, codesOf(none)]).toEqual([422, ['field.required']])
  })

  it('B-88: is shown without position, camera and time, turned upright and at most 2000 pixels long', async () => {
    const original = await buildPhonePhoto()
    expect(exifReader((await sharp(original).metadata()).exif ?? Buffer.alloc(0)).GPSInfo).toBeDefined()
    const made = await send(original)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ takenAt: '2026-06-16T13:12:30.000Z', served: { width: 667, height: 2000 } })
    const shown = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).expect(200)
    const { exif, xmp, iptc, icc } = await sharp(shown.body as Buffer).metadata()
    expect([exif, xmp, iptc, icc]).toEqual([undefined, undefined, undefined, undefined])
    const certifier = await house.as(farm.accounts.certifier)
    expect((await certifier.get(`/api/farms/${farm.id}/files/${made.body.id}`)).status).toBe(404)
  })
})

describe('a paper', () => {
  it('is a PDF, kept as it is and only ever saved, or a picture', async () => {
    const pdf = await drawPaper('Receipt', ['Soap 5 L'], new Date('2026-06-01T00:00:00Z'))
    const made = await send(pdf, { kind: 'paper', name: 'receipt.pdf' })
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ type: 'application/pdf', served: null })
    const got = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).expect(200)
    expect(sha256(got.body as Buffer)).toBe(sha256(pdf))
    expect(got.headers['content-disposition']).toBe('attachment; filename=receipt.pdf')
    expect((await send(await buildPicture(), { kind: 'paper', name: 'label.jpg' })).status).toBe(201)
    const asPhoto = await send(pdf, { kind: 'photo', name: 'receipt.pdf' })
    expect([asPhoto.status, codesOf(asPhoto)]).toEqual([415, ['file.photo_type']])
  })
})

describe('names', () => {
  it.each([
    { row: 'B-75', name: '../../etc/passwd', label: 'passwd' },
    { row: 'B-77', name: 'Feld-Ärger.png', label: 'Feld-Ärger.png' },
    { row: 'B-76 and B-61', name: 'a\u202Egnp.png', label: 'a gnp.png' },
  ])('$row: $name is kept as a label', async ({ name, label }) => {
    const made = await send(await buildPicture('png'), { name })
    expect([made.status, made.body.label]).toEqual([201, label])
  })

  it('B-76: quotes, line breaks and 500 characters become a label of 120 and split no header', async () => {
    const name = `x"y%0D%0ASet-Cookie: a=b ${'ä'.repeat(500)}.png`
    const made = await send(await buildPicture('png'), { name })
    expect(made.status).toBe(201)
    expect(made.body.label).toHaveLength(120)
    expect(made.body.label).toMatch(/^x.*….png$/)
    const got = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).expect(200)
    expect(got.headers['set-cookie']).toBeUndefined()
    expect(got.headers['content-disposition']).toContain("filename*=UTF-8''x%22y")
  })

  it('B-75: the store knows farm and digest, never a name', async () => {
    const { kept } = await countAll()
    expect(kept.every((name) => /^[0-9a-f]{64}$/.test(name))).toBe(true)
  })
})

describe('what is not taken leaves nothing behind', () => {
  const cases: { row: string; bytes: () => Buffer | Promise<Buffer>; sent?: Sent; status: number; code: string }[] = [
    { row: 'B-79: PNG announced as text/html', bytes: () => buildPicture('png'), sent: { name: 'a.png', announced: 'text/html' }, status: 415, code: 'file.name_differs' },
    { row: 'B-79: PNG called .exe', bytes: () => buildPicture('png'), sent: { name: 'a.exe' }, status: 415, code: 'file.name_differs' },
    { row: 'B-80: text called .jpg', bytes: () => Buffer.from('only words, and enough of them to read'), status: 415, code: 'file.type' },
    { row: 'B-81: SVG with a script', bytes: () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'), sent: { name: 'a.svg', announced: 'image/svg+xml' }, status: 415, code: 'file.type' },
    { row: '5.2.3: a ZIP', bytes: () => Buffer.from('504b0304140000000000', 'hex'), sent: { name: 'a.zip', kind: 'paper' }, status: 415, code: 'file.type' },
    { row: 'B-82: 0 bytes', bytes: () => Buffer.alloc(0), status: 422, code: 'file.empty' },
    { row: 'B-83: 11 MB', bytes: () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe0]), Buffer.alloc(11 * MB)]), status: 413, code: 'file.too_large' },
    { row: 'B-84: 30,000 by 30,000 pixels', bytes: () => buildHugePng(30_000, 30_000), sent: { name: 'a.png' }, status: 422, code: 'image.pixels' },
    { row: 'B-84: cut off', bytes: async () => (await drawPhoto()).subarray(0, 20_000), status: 422, code: 'image.broken' },
    { row: 'B-91: HEIC', bytes: buildHeic, sent: { name: 'IMG_1.HEIC', announced: 'image/heic' }, status: 415, code: 'file.camera_only' },
  ]
  it.each(cases)('$row', async ({ bytes, sent = {}, status, code }) => {
    const before = await countAll()
    const response = await send(await bytes(), sent)
    expect([response.status, response.body.code === 'invalid' ? codesOf(response)[0] : response.body.code]).toEqual([status, code])
    expect(response.body.detail.length).toBeGreaterThan(20)
    expect(await countAll()).toEqual(before)
  })

  it('B-84: a picture beyond the limit is refused from its header, without the memory it would take', async () => {
    const huge = buildHugePng(30_000, 30_000)
    expect(huge.length).toBeLessThan(120_000)
    const before = process.memoryUsage().rss
    await send(huge, { name: 'a.png' })
    expect(process.memoryUsage().rss - before).toBeLessThan(200 * MB)
  })

  it('B-78: a JPEG that is also a page and an archive comes out as nothing but a picture', async () => {
    const both = Buffer.concat([await buildPicture('jpeg'), Buffer.from('<html><script>alert(1)</script></html>'), Buffer.from('504b0506', 'hex')])
    const made = await send(both)
    expect(made.status).toBe(201)
    const got = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}`).expect(200)
    expect((got.body as Buffer).includes('<script>')).toBe(false)
    expect(got.headers).toMatchObject({ 'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff' })
    expect(got.headers['content-disposition']).toMatch(/^attachment;/)
  })

  it('B-90: beyond the farm’s room, while the record itself is saved', async () => {
    house.services.config.files.quotaBytes = 10_000
    const before = await countAll()
    const full = await send(await buildPicture('jpeg', { width: 800, height: 800, colour: '#a1b2c3' }))
    expect([full.status, codesOf(full)]).toEqual([422, ['quota']])
    expect(await countAll()).toEqual(before)
    await draft(applicator)
    house.services.config.files.quotaBytes = QUOTA
  })

  it('B-92: while the store cannot keep it, and goes through afterwards', async () => {
    const { folder } = house.services.config.files
    const [bytes, id] = [await buildPicture('jpeg', { colour: '#0f0f0f' }), uuidV7()]
    const { rows } = await countAll()
    await rename(folder, `${folder}-away`)
    await writeFile(folder, 'no folder any more')
    const refused = await send(bytes, { id })
    await rm(folder)
    await rename(`${folder}-away`, folder)
    expect([refused.status, refused.body.code, refused.headers['retry-after']]).toEqual([503, 'file_store', '60'])
    expect((await countAll()).rows).toBe(rows)
    expect((await send(bytes, { id })).status).toBe(201)
  })

  it('a record takes 20', async () => {
    const to = await draft(applicator)
    const bytes = await buildPicture()
    for (let count = 0; count < 20; count += 1) expect((await send(bytes, { to })).status).toBe(201)
    const more = await send(bytes, { to })
    expect([more.status, codesOf(more)]).toEqual([422, ['file.too_many']])
  })
})

describe('the request', () => {
  let server: Server
  let port: number
  let cookie: string

  beforeAll(async () => {
    server = createServer(house.app)
    await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve) })
    port = (server.address() as AddressInfo).port
    const session = await supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.applicator.email, password: PASSWORD })
    const given = session.headers['set-cookie'] as unknown as string[]
    cookie = given.map((line) => line.split(';')[0]).join('; ')
  })
  afterAll(() => new Promise((resolve) => { server.close(resolve); server.closeAllConnections() }))

  const path = () => `/api/farms/${farm.id}/records/${recordId}/files`
  const part = (name: string, value: string) => `--B\r\nContent-Disposition: form-data; name="${name}"\r\n\r\n${value}\r\n`

  /** Sends raw bytes of a body; `declared` is the length that its head promises. */
  function raw(body: Buffer, { type = 'multipart/form-data; boundary=B', own = true, declared = body.length } = {}): Promise<{ status: number; body: string }> {
    return new Promise((resolve, reject) => {
      const socket = connect(port, '127.0.0.1')
      const head = [`POST ${path()} HTTP/1.1`, 'Host: x', `Cookie: ${cookie}`, `Content-Type: ${type}`, `Content-Length: ${declared}`, 'Connection: close', ...(own ? ['X-Requested-With: drenchleaf'] : [])]
      let answer = ''
      socket.on('data', (data) => { answer += data.toString() })
      socket.on('end', () => resolve({ status: Number(answer.slice(9, 12)), body: answer }))
      socket.on('error', reject)
      socket.write(`${head.join('\r\n')}\r\n\r\n`)
      // A body that is shorter than promised: this side says that it is done.
      if (declared > body.length) socket.end(body)
      else socket.write(body)
    })
  }

  it.each([0.1, 0.5, 0.99])('B-85: cut at %d of its length, it leaves nothing', async (share) => {
    const before = await countAll()
    const whole = Buffer.concat([
      Buffer.from(`${part('id', uuidV7())}${part('kind', 'photo')}--B\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\nContent-Type: image/jpeg\r\n\r\n`),
      await drawPhoto(), Buffer.from('\r\n--B--\r\n'),
    ])
    const { status } = await raw(whole.subarray(0, Math.floor(whole.length * share)), { declared: whole.length })
    expect([0, 400]).toContain(status)
    expect(await countAll()).toEqual(before)
    const { status: ended } = await raw(whole.subarray(0, Math.floor(whole.length * share)))
    expect(ended).toBe(400)
    expect(await countAll()).toEqual(before)
    expect((await raw(whole)).status).toBe(201)
  })

  it.each([
    { row: 'B-86: without boundary', type: 'multipart/form-data', body: 'anything', status: 400 },
    { row: 'with a boundary that never comes', type: 'multipart/form-data; boundary=B', body: 'anything', status: 400 },
    { row: 'B-87: 1,000 fields', type: 'multipart/form-data; boundary=B', body: `${Array.from({ length: 1000 }, (_, index) => part(`f${index}`, 'x')).join('')}--B--\r\n`, status: 413 },
    { row: 'B-87: 100 files', type: 'multipart/form-data; boundary=B', body: `${Array.from({ length: 100 }, () => '--B\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\nx\r\n').join('')}--B--\r\n`, status: 413 },
    { row: 'B-87: 5,000 header pairs of a part, no head of a part but noise (400, not 413),', type: 'multipart/form-data; boundary=B', body: `--B\r\n${Array.from({ length: 5000 }, (_, index) => `X-${index}: y\r\n`).join('')}Content-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\nx\r\n--B--\r\n`, status: 400 },
    { row: 'a field of a million letters', type: 'multipart/form-data; boundary=B', body: `${part('kind', 'x'.repeat(1_000_000))}--B--\r\n`, status: 413 },
    { row: 'a file under another name', type: 'multipart/form-data; boundary=B', body: '--B\r\nContent-Disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\nx\r\n--B--\r\n', status: 422 },
    { row: 'JSON', type: 'application/json', body: '{}', status: 415 },
    { row: 'a field that would change every object', type: 'multipart/form-data; boundary=B', body: `${part('__proto__', 'x')}${part('id', uuidV7())}--B--\r\n`, status: 422 },
  ])('$row is refused as such', async ({ type, body, status }) => {
    const before = await countAll()
    const answer = await raw(Buffer.from(body), { type })
    expect(answer.status).toBe(status)
    expect(answer.body).toContain('application/problem+json')
    expect(await countAll()).toEqual(before)
  })

  it('SEC-03: a form of another site is refused, since it cannot set our header', async () => {
    const answer = await raw(Buffer.from(`${part('kind', 'photo')}--B--\r\n`), { own: false })
    expect(answer.status).toBe(403)
    expect(answer.body).toContain('foreign_request')
  })

  it('multipart has no door but this one', async () => {
    const response = await manager.post(`/api/farms/${farm.id}/blocks`).field('code', 'X')
    expect(response.status).toBe(415)
  })
})

describe('who may', () => {
  it('an applicator adds to what they did or entered; managers and owners to any', async () => {
    const theirs = await draft(manager)
    const bytes = await buildPicture()
    const refused = await send(bytes, { to: theirs })
    expect([refused.status, refused.body.code]).toEqual([403, 'record.not_yours'])
    expect((await send(bytes, { by: manager })).status).toBe(201)
  })

  it('a picture’s original opens for leaders and whoever added it', async () => {
    const made = await send(await buildPicture(), { by: manager })
    expect((await manager.get(`/api/farms/${farm.id}/files/${made.body.id}?original=1`)).status).toBe(200)
    expect((await applicator.get(`/api/farms/${farm.id}/files/${made.body.id}?original=1`)).body.code).toBe('file.original')
    expect((await applicator.get(`/api/farms/${farm.id}/files/${made.body.id}`)).status).toBe(200)
  })

  it('B-95: an id that another farm has is free here, and tells nothing', async () => {
    const other = await house.makeFarm()
    const owner = await house.as(other.accounts.owner)
    const theirRecord = await draft(owner, { farm: other, things: await seedThings(house, other) })
    const id = uuidV7()
    await owner.post(`/api/farms/${other.id}/records/${theirRecord}/files`).field({ id, kind: 'photo' }).attach('file', await buildPicture(), 'a.jpg').expect(201)
    expect((await manager.get(`/api/farms/${farm.id}/files/${id}`)).status).toBe(404)
    expect((await send(await buildPicture('jpeg', { colour: '#ffeedd' }), { id })).status).toBe(201)
  })
})

describe('taking back and signing', () => {
  it('takes a file back while it is unsigned: out of the list, its bytes gone, its row kept', async () => {
    const to = await draft(applicator)
    const bytes = await buildPicture('jpeg', { colour: '#00aa00' })
    const twin = await send(bytes, { to })
    const { body } = await send(bytes, { to })
    await applicator.delete(`/api/farms/${farm.id}/files/${body.id}`).expect(204)
    await applicator.delete(`/api/farms/${farm.id}/files/${body.id}`).expect(204)
    expect((await applicator.get(`/api/farms/${farm.id}/files/${body.id}`)).status).toBe(404)
    expect((await applicator.get(`/api/farms/${farm.id}/records/${to}/files`)).body.items).toHaveLength(1)
    expect((await applicator.get(`/api/farms/${farm.id}/files/${twin.body.id}`)).status).toBe(200)
    await applicator.delete(`/api/farms/${farm.id}/files/${twin.body.id}`).expect(204)
    expect((await countAll()).kept).not.toContain(body.digest)
    const again = await send(bytes, { to, id: body.id })
    expect([again.status, again.body.removedAt]).toEqual([200, '2026-06-16T14:00:00.000Z'])
  })

  it('keeps what was signed, shows it to the certifier of that season, and marks what comes later', async () => {
    const to = await draft(manager)
    const before = await send(await buildPicture(), { to, by: manager })
    const certifier = await house.as(farm.accounts.certifier)
    expect((await certifier.get(`/api/farms/${farm.id}/records/${to}/files`)).status).toBe(404)
    const input = buildRecord(things)
    await manager.post(`/api/farms/${farm.id}/records`).send(input).expect(201)
    const held = await send(await buildPicture(), { to: input.id, by: manager })
    await manager.post(`/api/farms/${farm.id}/records/${input.id}/sign`).send({ password: PASSWORD }).expect(200)
    const refused = await manager.delete(`/api/farms/${farm.id}/files/${held.body.id}`)
    expect([refused.status, refused.body.code]).toEqual([409, 'file.signed'])
    const later = await send(await buildPicture(), { to: input.id, by: manager })
    expect(later.status).toBe(201)
    const { body } = await certifier.get(`/api/farms/${farm.id}/records/${input.id}/files`).expect(200)
    expect(body.items.map((item: { id: string; signedVersion: number | null }) => [item.id, item.signedVersion])).toEqual([[held.body.id, 1], [later.body.id, null]])
    await certifier.get(`/api/farms/${farm.id}/files/${held.body.id}`).expect(200)
    expect((await certifier.get(`/api/farms/${farm.id}/files/${before.body.id}`)).status).toBe(404)
    await manager.delete(`/api/farms/${farm.id}/files/${later.body.id}`).expect(204)
  })

  it('refuses changes of what stands, whoever writes to the table', async () => {
    const attempts = [
      "UPDATE attachments SET removed_at = now() WHERE farm_id = $1 AND signed_version = 1",
      "UPDATE attachments SET signed_version = NULL WHERE farm_id = $1 AND signed_version = 1",
      "UPDATE attachments SET label = 'other' WHERE farm_id = $1",
      'DELETE FROM attachments WHERE farm_id = $1',
    ]
    for (const attempt of attempts) {
      const change = house.services.database.inFarm({ farmId: farm.id, seasons: null }, (db) => db.query(attempt, [farm.id]))
      await expect(change, attempt).rejects.toMatchObject({ code: '42501' })
    }
  })

  it('serves no bytes that are not those it took in', async () => {
    const made = await send(await buildPicture('jpeg', { colour: '#010203' }), { by: manager })
    await writeFile(join(house.services.config.files.folder, farm.id, made.body.digest as string), 'something else')
    const got = await manager.get(`/api/farms/${farm.id}/files/${made.body.id}?original=1`)
    expect([got.status, got.body.code]).toEqual([503, 'file_store'])
  })
})
