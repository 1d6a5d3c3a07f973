import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { buffer } from 'node:stream/consumers'

/** A store on loopback that answers the four calls of the S3 API that the register makes. */
export interface TestBucket {
  url: string
  objects: Map<string, Buffer>
  /** Authorization headers, in order. */
  signatures: string[]
  /** Status of every answer from now on; null: as it should be. */
  failWith(status: number | null): void
  close(): Promise<void>
}

const absent = (code: string) => `<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>${code}</Message></Error>`

/** Opens the store. @param name of its one bucket. */
export async function openBucket(name: string): Promise<TestBucket> {
  const objects = new Map<string, Buffer>()
  const signatures: string[] = []
  let failing: number | null = null
  const server = createServer((request, response) => {
    void buffer(request).then((body) => {
      signatures.push(request.headers.authorization ?? '')
      const answer = (status: number, content: string | Buffer = '') => response.writeHead(status, { 'Content-Length': Buffer.byteLength(content), 'Content-Type': 'application/xml' }).end(content)
      const key = new URL(request.url ?? '', 'http://x').pathname.slice(name.length + 2)
      if (failing !== null) return answer(failing, absent('SlowDown'))
      if (!request.url?.startsWith(`/${name}/`)) return answer(404, absent('NoSuchBucket'))
      if (request.method === 'PUT') return answer(200, (objects.set(key, body), ''))
      if (request.method === 'DELETE') return answer(204, (objects.delete(key), ''))
      const found = objects.get(key)
      if (!found) return answer(404, request.method === 'HEAD' ? '' : absent('NoSuchKey'))
      return answer(200, request.method === 'HEAD' ? '' : found)
    })
  })
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve) })
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    objects,
    signatures,
    failWith: (status) => { failing = status },
    close: () => new Promise((resolve) => { server.close(() => resolve()); server.closeAllConnections() }),
  }
}
