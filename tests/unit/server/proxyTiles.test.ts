import { createServer, type RequestListener, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { afterEach, describe, expect, it } from 'vitest'
import { fetchPicture } from '../../../server/adapters/tiles/fetchPicture.ts'
import { isPrivateAddress } from '../../../server/adapters/tiles/isPrivateAddress.ts'
import { createProxyTiles } from '../../../server/adapters/tiles/proxyTiles.ts'

const PICTURE = Buffer.from('a square of ground')
let server: Server | null = null
let asked: string[] = []

/** A tile service on this machine; its address is written as a number, as an operator may. */
async function serve(answer: RequestListener, host = '127.0.0.1'): Promise<string> {
  asked = []
  const opened = createServer((request, response) => {
    asked.push(request.url ?? '')
    answer(request, response)
  })
  server = opened
  await new Promise<void>((resolve) => { opened.listen(0, '127.0.0.1', resolve) })
  return `http://${host}:${(opened.address() as AddressInfo).port}/ground/{z}/{x}/{y}.png?key=k`
}
afterEach(async () => {
  server?.closeAllConnections()
  if (server !== null) await new Promise((resolve) => { server?.close(resolve) })
  server = null
})
const tilesAt = (template: string) => createProxyTiles({ template, attribution: 'Somebody', maxZoom: 18 })
const png: RequestListener = (_request, response) => { response.setHeader('Content-Type', 'image/png').end(PICTURE) }

describe('tiles of a service', () => {
  it('are fetched from its one address and kept', async () => {
    const tiles = tilesAt(await serve(png))
    const read = await Promise.all([tiles.read(3, 1, 7), tiles.read(3, 1, 7)])
    expect(await tiles.read(3, 1, 7)).toEqual({ contentType: 'image/png', bytes: PICTURE })
    expect(read).toHaveLength(2)
    expect(asked).toEqual(['/ground/3/1/7.png?key=k'])
  })

  it.each([[3, 8, 0], [3, 0, 8], [19, 0, 0], [-1, 0, 0], [3, 0.5, 0], [3, -1, 0], [Number.NaN, 0, 0]])('are not asked for outside the grid: %d/%d/%d', async (z, x, y) => {
    const tiles = tilesAt(await serve(png))
    await expect(tiles.read(z, x, y)).rejects.toMatchObject({ code: 'not_found' })
    expect(asked).toEqual([])
  })

  it.each<{ name: string; answer: RequestListener }>([
    { name: 'a redirect', answer: (request, response) => { response.writeHead(302, { Location: `http://${request.headers.host ?? ''}/elsewhere` }).end() } },
    { name: 'a page', answer: (_request, response) => { response.setHeader('Content-Type', 'text/html').end('<p>') } },
    { name: 'a drawing that can hold more', answer: (_request, response) => { response.setHeader('Content-Type', 'image/svg+xml').end('<svg/>') } },
    { name: 'no type', answer: (_request, response) => { response.end(PICTURE) } },
    { name: 'more than 1 MB', answer: (_request, response) => { response.setHeader('Content-Type', 'image/png').end(Buffer.alloc(1_000_001)) } },
    { name: 'nothing', answer: (_request, response) => { response.setHeader('Content-Type', 'image/png').end() } },
    { name: 'a fault', answer: (_request, response) => { response.writeHead(500).end() } },
    { name: 'a broken line', answer: (request) => { request.socket.destroy() } },
  ])('that answer with $name are refused, and asked for again the next time', async ({ answer }) => {
    const tiles = tilesAt(await serve(answer))
    await expect(tiles.read(0, 0, 0)).rejects.toMatchObject({ code: 'tiles', status: 503 })
    await expect(tiles.read(0, 0, 0)).rejects.toMatchObject({ code: 'tiles' })
    expect(asked).toEqual(['/ground/0/0/0.png?key=k', '/ground/0/0/0.png?key=k'])
  })

  it('that are not there are said to be none', async () => {
    const tiles = tilesAt(await serve((_request, response) => { response.writeHead(404).end() }))
    await expect(tiles.read(0, 0, 0)).rejects.toMatchObject({ code: 'not_found' })
  })

  it('are not waited for without end', async () => {
    const template = await serve(() => undefined)
    expect(await fetchPicture(template.replaceAll(/\{\w\}/g, '0'), 50)).toEqual({ state: 'failed' })
  })

  it('are not fetched by a name that leads into a private network', async () => {
    const tiles = tilesAt(await serve(png, 'localhost'))
    await expect(tiles.read(0, 0, 0)).rejects.toMatchObject({ code: 'tiles' })
    expect(asked).toEqual([])
  })
})

// Ranges of RFC 1918, 4193, 3927, 4291, 6598 and 5737, each with a neighbour outside it.
it.each([
  ['10.255.0.1', true], ['11.0.0.1', false], ['172.31.255.255', true], ['172.32.0.1', false], ['192.168.1.1', true], ['192.169.1.1', false], ['100.64.0.1', true],
  ['100.63.255.255', false], ['127.0.0.1', true], ['169.254.169.254', true], ['0.0.0.0', true], ['203.0.113.9', true], ['8.8.4.4', false],
  ['::1', true], ['::', true], ['fd00::1', true], ['fe80::1', true], ['2001:db8::1', true], ['2a00:1450::1', false], ['::ffff:10.0.0.1', true], ['::ffff:8.8.4.4', false],
])('%s is private: %s', (address, is) => expect(isPrivateAddress(address)).toBe(is))
