import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { chromium, type Page } from '@playwright/test'
import vue from '@vitejs/plugin-vue'
import { build, type Rolldown } from 'vite'
import { findChromium } from '../../../server/cli/lib/chromium.mjs'
import { assertSame, measureRounds } from '../measureRounds.ts'
import type { Summary } from '../statistics.ts'
import type { Effort } from './overHttp.ts'

const TYPES: Record<string, string> = { html: 'text/html', js: 'text/javascript', css: 'text/css' }

/** First drawing of 5,000 blocks and five moves of the map in our own component, beside bare Leaflet on its canvas, in a browser. */
export async function measureMap({ times, rounds }: Effort): Promise<Summary> {
  const served = await serve(await buildFiles())
  const browser = await chromium.launch({ executablePath: findChromium() ?? '' })
  try {
    const page = await browser.newPage({ viewport: { width: 1_000, height: 800 } })
    await page.goto(served.url)
    const [ours, baseline] = [await draw(page, 'drawOurs'), await draw(page, 'drawBare')]
    assertSame('map', ours, baseline)
    const repeat = (name: 'drawOurs' | 'drawBare') => async (count: number): Promise<void> => {
      for (let turn = 0; turn < count; turn += 1) await draw(page, name)
    }
    return await measureRounds({ ours: repeat('drawOurs'), baseline: repeat('drawBare'), times, rounds })
  } finally {
    await browser.close()
    served.stop()
  }
}

function draw(page: Page, name: 'drawOurs' | 'drawBare'): Promise<unknown> {
  return page.evaluate((each) => (window as unknown as Record<string, () => Promise<unknown>>)[each]?.(), name)
}

async function buildFiles(): Promise<Map<string, string | Uint8Array>> {
  const built = await build({
    logLevel: 'error', configFile: false, root: 'tests/bench/baselines/mapApp', plugins: [vue()], build: { write: false },
  })
  const { output } = built as Rolldown.RolldownOutput
  return new Map(output.map((file) => [`/${file.fileName}`, file.type === 'chunk' ? file.code : file.source]))
}

async function serve(files: ReadonlyMap<string, string | Uint8Array>): Promise<{ url: string; stop: () => void }> {
  const server = createServer((request, response) => {
    const path = request.url === '/' ? '/index.html' : (request.url ?? '')
    const found = files.get(path)
    response.writeHead(found === undefined ? 404 : 200, { 'Content-Type': TYPES[path.split('.').at(-1) ?? ''] ?? 'application/octet-stream' }).end(found)
  })
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve) })
  return { url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/`, stop: () => { server.close() } }
}
