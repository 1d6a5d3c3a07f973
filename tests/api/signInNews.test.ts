import { generate } from 'otplib'
import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { KeptLetter } from '../../server/adapters/mail/keptMail.ts'
import { translate } from '../../shared/messages/translate.ts'
import { inviteOwner } from '../../server/services/welcome.ts'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const FIREFOX = 'Mozilla/5.0 (Android 15; Mobile; rv:140.0) Gecko/140.0 Firefox/140.0'

let house: TestHouse
let farm: TestFarm
let turn = 0

beforeAll(async () => { house = await openHouse({ config: { publicUrl: 'http://register.example' } }) })
afterAll(() => house.close())
beforeEach(async () => {
  house.setNow(NOW)
  farm = await house.makeFarm()
})

/** A browser at an address of its own, behind the proxy of the public address. */
function openBrowser(agentWords = FIREFOX): Agent {
  const agent = supertest.agent(house.app)
  turn += 1
  void agent.set({ 'X-Requested-With': 'drenchleaf', 'X-Forwarded-For': `203.0.${Math.floor(turn / 250)}.${turn % 250}`, 'User-Agent': agentWords })
  return agent
}
const signIn = (agent: Agent, more: { email?: string; password?: string; code?: string } = {}) =>
  agent.post('/api/session').send({ email: farm.accounts.owner.email, password: PASSWORD, ...more })
const en = (id: string, params: Record<string, string | number> = {}) => translate('en', id, params)
const subjects = (letters: KeptLetter[]): string[] => letters.map(({ subject }) => subject).sort()
const mail = (): Promise<KeptLetter[]> => house.mailTo(farm.accounts.owner.email)
const [NEW_DEVICE, CODE_WRONG] = [en('mail.signIn.newDeviceSubject'), en('mail.signIn.codeWrongSubject')]

describe('a sign-in on a new device (6.3.5)', () => {
  it('is told of: when, on what, from which network, and what to do; the same device is not told of again', async () => {
    const browser = openBrowser()
    await signIn(browser).expect(200)
    await browser.delete('/api/session').expect(204)
    await signIn(browser, { email: farm.accounts.owner.email.toUpperCase() }).expect(200)
    const letters = await mail()
    expect(letters).toHaveLength(1)
    expect(letters[0]).toMatchObject({ subject: NEW_DEVICE, language: 'en' })
    for (const words of ['16 June 2026 at 14:00 UTC', 'Firefox, Android', '203.0.0.0/24', 'http://register.example/reset']) expect(letters[0]?.text).toContain(words)
  })

  it('is told of in the person’s language', async () => {
    await house.services.database.inHouse((manager) => manager.query("UPDATE accounts SET language = 'es' WHERE id = $1", [farm.accounts.owner.id]))
    await signIn(openBrowser()).expect(200)
    expect((await mail())[0]).toMatchObject({ subject: translate('es', 'mail.signIn.newDeviceSubject'), language: 'es' })
  })

  it('is not told of on the device that took the first password', async () => {
    const email = `new-${farm.id}@farm.example`
    const { token } = await inviteOwner(house.services, email)
    const browser = openBrowser()
    await browser.post('/api/welcome').send({ token, name: 'New', password: 'another long password' }).expect(204)
    await signIn(browser, { email, password: 'another long password' }).expect(200)
    expect(await house.mailTo(email)).toEqual([])
  })
})

describe('a right password with a wrong code', () => {
  it('is told of once an hour, and is no sign-in', async () => {
    const browser = openBrowser()
    await signIn(browser).expect(200)
    const { body } = await browser.post('/api/me/second-factor').send({ password: PASSWORD }).expect(200)
    await browser.put('/api/me/second-factor').send({ code: await generate({ secret: body.secret as string, epoch: Date.parse(NOW) / 1000 }) }).expect(200)
    const stranger = openBrowser()
    await signIn(stranger).expect(401)
    for (const code of ['000000', '000001']) await signIn(stranger, { code }).expect(401)
    expect(subjects(await mail())).toEqual([CODE_WRONG, NEW_DEVICE, en('mail.factorChanged.setSubject')].sort())
    house.setNow('2026-06-16T15:00:00.000Z')
    await signIn(stranger, { code: '000002' }).expect(401)
    expect(subjects(await mail()).filter((subject) => subject === CODE_WRONG)).toHaveLength(2)
  })
})

describe('a sign-in after wrong tries', () => {
  it('is told of from the fifth on, from wherever they came, with their number; then counting begins anew', async () => {
    const own = openBrowser()
    await signIn(own).expect(200)
    for (let guess = 0; guess < 4; guess += 1) await signIn(openBrowser(), { password: `guess ${guess}` }).expect(401)
    await signIn(own).expect(200)
    expect(subjects(await mail())).toEqual([NEW_DEVICE])
    for (let guess = 0; guess < 6; guess += 1) await signIn(openBrowser(), { password: `guess ${guess}` }).expect(401)
    await signIn(own).expect(200)
    await signIn(own).expect(200)
    expect(subjects(await mail())).toEqual([NEW_DEVICE, en('mail.signIn.afterFailuresSubject', { tries: 6 })].sort())
  })
})

describe('another second factor (6.3.7)', () => {
  it('is told of each time: set up, other codes, taken away; and by whom, where an owner did it', async () => {
    const browser = openBrowser()
    await signIn(browser).expect(200)
    const setUp = async (agent: Agent) => {
      const { body } = await agent.post('/api/me/second-factor').send({ password: PASSWORD }).expect(200)
      const { body: made } = await agent.put('/api/me/second-factor').send({ code: await generate({ secret: body.secret as string, epoch: house.services.clock.now().getTime() / 1000 }) }).expect(200)
      return (made as { codes: string[] }).codes
    }
    const [first] = await setUp(browser)
    const { body } = await browser.post('/api/me/second-factor/codes').send({ password: PASSWORD, code: first }).expect(200)
    await browser.post('/api/me/second-factor/remove').send({ password: PASSWORD, code: (body as { codes: string[] }).codes[0] }).expect(204)
    const told = (news: string) => en(`mail.factorChanged.${news}Subject`)
    expect(subjects(await mail())).toEqual([NEW_DEVICE, told('set'), told('codes'), told('removed')].sort())

    const manager = openBrowser()
    await signIn(manager, { email: farm.accounts.manager.email }).expect(200)
    await setUp(manager)
    await browser.post(`/api/farms/${farm.id}/people/${farm.personIds.manager}/reset-factor`).send({ password: PASSWORD }).expect(204)
    expect(subjects(await house.mailTo(farm.accounts.manager.email))).toContain(told('reset'))
  })
})
