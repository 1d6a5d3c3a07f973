import { createServer, type Socket } from 'node:net'
import { once } from 'node:events'
import type { AddressInfo } from 'node:net'
import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createSmtpMailer } from '../../server/adapters/mail/smtpMailer.ts'
import { Letter } from '../../server/entities/Letter.ts'
import { queueLetter, type NewLetter } from '../../server/services/mail/queueLetter.ts'
import { sendDueLetters } from '../../server/services/mail/sendDueLetters.ts'
import { NOW, openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let mine: TestFarm
let theirs: TestFarm

beforeAll(async () => {
  house = await openHouse({ config: { publicUrl: 'https://register.example' } })
  mine = await house.makeFarm()
  theirs = await house.makeFarm()
})
beforeEach(() => house.setNow(NOW))
afterAll(() => house.close())

let turn = 0
type Invitation = Extract<NewLetter, { kind: 'invitation' }>
const buildLetter = (changes: Partial<Invitation> = {}): Invitation => ({
  farmId: mine.id, kind: 'invitation', params: { farm: 'Long Bank', by: 'Oda Verrill', role: 'manager', token: 'a-secret-of-this-letter', untilOn: '2026-06-19' },
  to: { email: `reader-${(turn += 1)}@farm.example`, name: null }, language: 'en', ...changes,
})
const queue = (letter: NewLetter): Promise<void> => {
  const work = (manager: Parameters<typeof queueLetter>[1]) => queueLetter(house.services, manager, letter)
  return letter.farmId === null ? house.services.database.inHouse(work) : house.services.database.inFarm({ farmId: letter.farmId, seasons: null }, work)
}
const rowOf = async (email: string) => (await house.services.database.inPost((manager) => manager.findBy(Letter, { toEmail: email })))[0]

describe('the outbox', () => {
  it('sends what a transaction wrote, once, in HTML and text, from the public address', async () => {
    const letter = buildLetter({ to: { email: 'ana@farm.example', name: 'Ana, of the "Bank"' }, replyTo: { email: 'oda@farm.example', name: 'Oda Verrill' } })
    await queue(letter)
    const [first, ...others] = await house.mailTo('ana@farm.example')
    expect(others).toEqual([])
    expect(first).toMatchObject({ subject: 'You are invited to Long Bank', from: 'register@farm.example', replyTo: 'oda@farm.example', language: 'en', to: ['ana@farm.example'] })
    expect(first?.text).toContain('https://register.example/welcome/a-secret-of-this-letter')
    expect(first?.text).toContain('Hello Ana, of the "Bank",')
    expect(first?.html).toContain('href="https://register.example/welcome/a-secret-of-this-letter"')
    expect(first?.html).toContain('<html lang="en">')
    expect(await house.mailTo('ana@farm.example')).toHaveLength(1)
  })

  it('sends nothing of a transaction that was taken back', async () => {
    const letter = buildLetter()
    const work = house.services.database.inFarm({ farmId: mine.id, seasons: null }, async (manager) => {
      await queueLetter(house.services, manager, letter)
      throw new Error('on purpose')
    })
    await expect(work).rejects.toThrow('on purpose')
    expect(await house.mailTo(letter.to.email)).toEqual([])
  })

  it('writes in the language of the letter', async () => {
    const letter = buildLetter({ language: 'es' })
    await queue(letter)
    const [got] = await house.mailTo(letter.to.email)
    expect(got).toMatchObject({ subject: 'Tiene una invitación a Long Bank', language: 'es' })
    expect(got?.html).toContain('<html lang="es">')
    expect(got?.text).toContain('hasta el 19 de junio de 2026')
  })

  it('blanks a secret once the letter is out', async () => {
    const letter = buildLetter()
    await queue(letter)
    expect(JSON.stringify(await rowOf(letter.to.email))).toContain('a-secret-of-this-letter')
    await house.mailTo(letter.to.email)
    expect(JSON.stringify(await rowOf(letter.to.email))).not.toContain('a-secret-of-this-letter')
  })

  it('queues what may be told once only once, a farm each for itself', async () => {
    const letter = buildLetter({ once: 'due 2026-06-16' })
    await queue(letter)
    await queue(letter)
    expect(await house.mailTo(letter.to.email)).toHaveLength(1)
    await queue({ ...letter, farmId: theirs.id })
    expect(await house.mailTo(letter.to.email)).toHaveLength(2)
  })
})

describe('who sees letters', () => {
  it('keeps a farm’s letters from other farms, and from whoever names none; the house’s from every farm', async () => {
    const ofFarm = buildLetter()
    const ofHouse = buildLetter({ farmId: null })
    await queue(ofFarm)
    await queue(ofHouse)
    const seen = async (work: Promise<Letter[]>) => (await work).map(({ toEmail }) => toEmail).filter((email) => [ofFarm.to.email, ofHouse.to.email].includes(email))
    const { database } = house.services
    expect(await seen(database.inFarm({ farmId: mine.id, seasons: null }, (manager) => manager.find(Letter)))).toEqual([ofFarm.to.email])
    expect(await seen(database.inFarm({ farmId: theirs.id, seasons: null }, (manager) => manager.find(Letter)))).toEqual([])
    expect(await seen(database.inFarm({ farmId: mine.id, seasons: [2026] }, (manager) => manager.find(Letter)))).toEqual([])
    expect(await seen(database.inHouse((manager) => manager.find(Letter)))).toEqual([ofHouse.to.email])
  })

  it('refuses a letter of another farm than the one that is named, and every change from a farm', async () => {
    await expect(house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) => queueLetter(house.services, manager, buildLetter({ farmId: theirs.id })))).rejects.toMatchObject({ code: '42501' })
    const letter = buildLetter()
    await queue(letter)
    await house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) => manager.query("UPDATE letters SET state = 'sent'"))
    expect(await rowOf(letter.to.email)).toMatchObject({ state: 'waiting' })
  })
})

describe('what would break a letter', () => {
  it.each([
    { email: 'a@farm.example\r\nBcc: b@farm.example', name: null },
    { email: 'a@farm.example, b@farm.example', name: null },
    { email: 'A <a@farm.example>', name: null },
    { email: 'a@farm.example', name: 'A\r\nBcc: b@farm.example' },
    { email: 'a@farm.example', name: 'A\u0000' },
  ])('is refused before it is written: %o', async (to) => {
    await expect(queue(buildLetter({ to }))).rejects.toThrow('Not one mailbox')
  })

  it('stands as text: signs of HTML, of templates and of addresses in a name reach exactly one reader', async () => {
    const letter = buildLetter({
      to: { email: 'one@farm.example', name: 'x, b@farm.example <c@farm.example>' },
      params: { farm: '<img src=x onerror=alert(1)> {{7*7}} ${7*7}', by: '"><script>', role: 'owner', token: 't', untilOn: '2026-06-19' },
    })
    await queue(letter)
    const [got] = await house.mailTo('one@farm.example')
    expect(got?.to).toEqual(['one@farm.example'])
    expect(got?.subject).toBe('You are invited to <img src=x onerror=alert(1)> {{7*7}} ${7*7}')
    expect(got?.html).not.toMatch(/<img|<script/)
    expect(got?.html).toContain('&lt;img src=x onerror=alert(1)&gt; {{7*7}} ${7*7}')
    expect(await house.mailTo('c@farm.example')).toEqual([])
  })
})

describe('a mail server that fails', () => {
  it('is tried again with longer and longer waits, under one Message-ID, and given up after a day', async () => {
    const letter = buildLetter()
    await queue(letter)
    const services = { ...house.services, mailer: createSmtpMailer('smtp://127.0.0.1:1', { name: '', address: 'r@farm.example' }) }
    const waits: number[] = []
    const start = Date.parse(NOW)
    let at = start
    for (;;) {
      house.setNow(new Date(at).toISOString())
      expect(await sendDueLetters(services)).toEqual({ sent: 0, failed: 1 })
      expect(await sendDueLetters(services)).toEqual({ sent: 0, failed: 0 })
      const row = await rowOf(letter.to.email)
      expect(row?.lastFault).toEqual({ reason: 'unreachable', answer: null })
      if (row?.state === 'dead') break
      waits.push((row?.nextTryAt.getTime() ?? 0) - at)
      at = row?.nextTryAt.getTime() ?? 0
    }
    await services.mailer.close()
    expect(waits.slice(0, 8).map((ms) => ms / 60_000)).toEqual([1, 2, 4, 8, 16, 32, 60, 60])
    expect(at - start).toBeGreaterThanOrEqual(24 * 3_600_000)
    expect(at - start).toBeLessThan(25 * 3_600_000)
    expect(JSON.stringify(await rowOf(letter.to.email))).not.toContain('a-secret-of-this-letter')
    expect(await house.mailTo(letter.to.email)).toEqual([])
  })

  it('that refuses, or goes after the letter was handed over, gets it again under the same Message-ID', async () => {
    const letter = buildLetter()
    await queue(letter)
    const seen: string[] = []
    let answers: ('refuse' | 'drop' | 'take')[] = ['refuse', 'drop', 'take']
    const server = createServer((socket) => speak(socket, () => answers[0] ?? 'take', (id) => {
      seen.push(id)
      answers = answers.slice(1)
    }))
    server.listen(0, '127.0.0.1')
    await once(server, 'listening')
    const services = { ...house.services, mailer: createSmtpMailer(`smtp://127.0.0.1:${(server.address() as AddressInfo).port}`, { name: '', address: 'r@farm.example' }) }
    expect(await sendDueLetters(services)).toEqual({ sent: 0, failed: 1 })
    expect((await rowOf(letter.to.email))?.lastFault).toEqual({ reason: 'refused', answer: 451 })
    house.setNow(new Date(Date.parse(NOW) + 61_000).toISOString())
    expect(await sendDueLetters(services)).toEqual({ sent: 0, failed: 1 })
    house.setNow(new Date(Date.parse(NOW) + 300_000).toISOString())
    expect(await sendDueLetters(services)).toEqual({ sent: 1, failed: 0 })
    const row = await rowOf(letter.to.email)
    expect(row).toMatchObject({ state: 'sent', tries: 3, lastFault: null })
    expect(seen).toEqual([row?.messageId, row?.messageId, row?.messageId])
    await services.mailer.close()
    server.close()
  })
})

/** As much of a mail server as the sender asks for (RFC 5321), with an answer of its own after each letter. */
function speak(socket: Socket, answer: () => 'refuse' | 'drop' | 'take', got: (messageId: string) => void): void {
  let data: string | null = null
  socket.setEncoding('utf8').on('error', () => undefined)
  socket.write('220 here\r\n')
  socket.on('data', (chunk: string) => {
    if (data === null) {
      const isData = /^DATA/i.test(chunk)
      if (isData) data = ''
      socket.write(isData ? '354 go on\r\n' : /^QUIT/i.test(chunk) ? '221 bye\r\n' : '250 ok\r\n')
      return
    }
    data += chunk
    if (!data.endsWith('\r\n.\r\n')) return
    const what = answer()
    got(/^Message-ID: (.*)$/im.exec(data)?.[1] ?? '')
    data = null
    if (what === 'drop') socket.destroy()
    else socket.write(what === 'take' ? '250 taken\r\n' : '451 later\r\n')
  })
}

describe('/dev/mail', () => {
  const read = (headers: Record<string, string> = {}) => supertest(house.app).get('/dev/mail').set(headers)

  it('shows this machine what was kept, as JSON and as a page', async () => {
    const letter = buildLetter({ params: { farm: '<b>Bank</b>', by: 'Oda', role: 'owner', token: 't', untilOn: '2026-06-19' } })
    await queue(letter)
    await house.mailTo(letter.to.email)
    const { body } = await read({ Accept: 'application/json' }).expect(200)
    expect(body.items[0]).toMatchObject({ to: [letter.to.email], subject: 'You are invited to <b>Bank</b>' })
    const page = await read({ Accept: 'text/html,*/*;q=0.8' }).expect(200)
    expect(page.text).toContain('You are invited to &lt;b&gt;Bank&lt;/b&gt;')
    expect(page.text).not.toContain('<b>Bank')
    const one = await supertest(house.app).get(`/dev/mail/${body.items[0].id}`).expect(200)
    expect(one.headers['content-security-policy']).toMatch(/^sandbox allow-popups; default-src 'none'/)
    await supertest(house.app).get('/dev/mail/999').expect(404)
  })

  it.each([{ Host: 'register.example' }, { 'X-Forwarded-For': '203.0.113.9' }, { Forwarded: 'for=203.0.113.9' }, { Host: '127.0.0.1.farm.example' }])('is not there for %o', async (headers) => {
    await read(headers as Record<string, string>).expect(404)
  })

  it('is not there where a mail server is named', async () => {
    const sending = await openHouse({ config: { mail: { smtpUrl: 'smtp://127.0.0.1:1', from: { name: '', address: 'r@farm.example' }, keptFile: null } } })
    expect((await supertest(sending.app).get('/dev/mail')).status).toBe(404)
    await sending.close()
  })
})
