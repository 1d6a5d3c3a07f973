import { Agent, request } from 'node:http'

export interface Answer { status: number; body: string }

/** Sends requests over one kept connection, as the signed-in person. */
export function openClient(base: string, cookie: string) {
  const agent = new Agent({ keepAlive: true, maxSockets: 1 })
  function send(method: string, path: string, body?: string): Promise<Answer> {
    const headers = { Cookie: cookie, 'X-Requested-With': 'drenchleaf', ...(body !== undefined && { 'Content-Type': 'application/json', 'Content-Length': String(Buffer.byteLength(body)) }) }
    return new Promise((resolve, reject) => {
      const sent = request(`${base}${path}`, { agent, method, headers }, (response) => {
        let text = ''
        response.setEncoding('utf8').on('data', (part: string) => { text += part }).on('end', () => { resolve({ status: response.statusCode ?? 0, body: text }) }).on('error', reject)
      })
      sent.on('error', reject).end(body)
    })
  }
  async function expect(status: number, method: string, path: string, body?: string): Promise<string> {
    const answer = await send(method, path, body)
    if (answer.status !== status) throw new Error(`${method} ${base}${path} answered ${answer.status}: ${answer.body.slice(0, 500)}`)
    return answer.body
  }
  return { expect, close: () => { agent.destroy() } }
}
export type Client = ReturnType<typeof openClient>
