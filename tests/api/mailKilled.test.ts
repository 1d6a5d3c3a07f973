import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { createServer, type AddressInfo, type Server, type Socket } from 'node:net'
import { afterAll, afterEach, beforeAll, expect, it } from 'vitest'
import { Letter } from '../../server/entities/Letter.ts'
import { queueLetter } from '../../server/services/mail/queueLetter.ts'
import { NOW, openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const LETTERS = 45
/** After how many handed over the process is killed: before the answer, and after it but before the letter is marked. */
const KILLS = [{ after: 7, answers: false }, { after: 12, answers: true }]
/** Longer than a letter stays in the hand of a process that died. */
const BETWEEN_MS = 11 * 60_000

let house: TestHouse
let farm: TestFarm
let post: Server
let child: ChildProcess | null = null
/** How often each Message-ID was handed over in full, and taken. */
const handed: string[] = []
const taken = new Set<string>()
let onLetter: () => 'take' | 'die' = () => 'take'

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  post = createServer(speak).listen(0, '127.0.0.1')
  await once(post, 'listening')
})
afterEach(() => { child?.kill('SIGKILL') })
afterAll(async () => {
  post.close()
  await house.close()
})

it(`loses none of ${LETTERS} letters whose transactions committed, however often the server is killed, and repeats them under their own Message-ID`, async () => {
  const queueSome = async (count: number, from: number): Promise<void> => {
    for (let place = from; place < from + count; place += 1) {
      await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) => queueLetter(house.services, manager, {
        farmId: farm.id, kind: 'passwordReset', language: 'en', to: { email: `reader-${place}@farm.example`, name: null }, params: { email: 'x', token: 't', minutes: 30 },
      }))
    }
  }
  for (const [turn, { after, answers }] of KILLS.entries()) {
    let seen = 0
    const died = new Promise<void>((resolve) => {
      onLetter = () => {
        seen += 1
        if (seen < after) return 'take'
        if (seen === after) {
          child?.once('exit', () => resolve())
          child?.kill('SIGKILL')
        }
        return answers ? 'take' : 'die'
      }
    })
    await startChild(turn)
    // Told of while it runs: some are committed as it dies.
    await queueSome(LETTERS / 3, turn * (LETTERS / 3))
    await died
  }
  onLetter = () => 'take'
  await queueSome(LETTERS / 3, KILLS.length * (LETTERS / 3))
  await startChild(KILLS.length)
  const rows = () => house.services.database.inPost((manager) => manager.find(Letter))
  await expect.poll(async () => (await rows()).filter(({ state }) => state === 'sent').length, { timeout: 60_000, interval: 250 }).toBe(LETTERS)
  const ids = (await rows()).map(({ messageId }) => messageId)
  expect(new Set(ids).size).toBe(LETTERS)
  expect([...taken].sort()).toEqual([...ids].sort())
  expect(handed.length).toBeGreaterThan(LETTERS)
  expect([...new Set(handed)].sort()).toEqual([...ids].sort())
}, 180_000)

async function startChild(turn: number): Promise<void> {
  const { config } = house.services
  child = spawn(process.execPath, ['--import', 'tsx', 'tests/support/postChild.ts'], {
    stdio: ['ignore', 'pipe', 'ignore'],
    env: {
      ...process.env, DATABASE_URL: config.databaseUrl, DATABASE_OWNER_URL: config.databaseOwnerUrl, SESSION_SECRET: config.sessionSecret,
      SMTP_URL: `smtp://127.0.0.1:${(post.address() as AddressInfo).port}`, MAIL_FROM: 'register@farm.example',
      FIXED_CLOCK: new Date(Date.parse(NOW) + turn * BETWEEN_MS).toISOString(), LOG_FILE: '/dev/null', DATA_DIR: config.files.folder,
    },
  })
  const said = await new Promise<string>((resolve) => {
    child?.stdout?.once('data', (chunk: Buffer) => resolve(chunk.toString()))
    child?.once('exit', (code) => resolve(`exit ${code}`))
  })
  expect(said).toBe('READY\n')
}

/** As much of a mail server as the sender asks for (RFC 5321). */
function speak(socket: Socket): void {
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
    const id = /^Message-ID: (.*)$/im.exec(data)?.[1] ?? ''
    data = null
    handed.push(id)
    if (onLetter() === 'die') return void socket.destroy()
    taken.add(id)
    socket.write('250 taken\r\n')
  })
}
