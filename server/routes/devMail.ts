import { Router, type Request, type RequestHandler } from 'express'
import type { KeptLetter, KeptMail } from '../adapters/mail/keptMail.ts'
import { notFound } from '../errors.ts'
import { escapeHtml } from '../escapeHtml.ts'

const LOOPBACK = /^(127(\.\d{1,3}){3}|::1|::ffff:127(\.\d{1,3}){3})$/
const LOOPBACK_NAME = /^(127(\.\d{1,3}){3}|localhost|\[::1\])(:\d+)?$/i
/** What a proxy in front of this server says of whom it asks for. */
const FORWARDED = ['Forwarded', 'X-Forwarded-For', 'X-Forwarded-Host', 'X-Real-IP', 'Via']

/**
 * Letters that the local stand-in kept, as JSON and as a page. They hold links that open accounts, so they are shown to this machine alone:
 * to a connection from loopback, under a name of loopback, through no proxy; elsewhere, and with a real mail server, there is nothing here.
 */
export function devMail(kept: KeptMail | null): Router {
  const router = Router()
  router.use(fromThisMachine(kept))
  if (kept === null) return router
  router.get('/', (request, response) => {
    response.set('Cache-Control', 'no-store')
    if (request.accepts(['json', 'html']) === 'html') response.type('html').send(renderList(kept.list()))
    else response.json({ items: kept.list(), next: null })
  })
  router.get('/style.css', (_request, response) => void response.type('css').send(STYLE))
  router.get('/:id', (request, response) => {
    const letter = kept.list().find(({ id }) => id === request.params.id)
    if (!letter) throw notFound()
    // Whatever a letter holds, it runs nothing, loads nothing and has no origin.
    response.set({ 'Cache-Control': 'no-store', 'Content-Security-Policy': "sandbox allow-popups; default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'" })
    response.type('html').send(letter.html)
  })
  return router
}

function fromThisMachine(kept: KeptMail | null): RequestHandler {
  return (request, _response, next) => {
    const isHere = LOOPBACK.test(request.socket.remoteAddress ?? '') && LOOPBACK_NAME.test(request.get('Host') ?? '') && !isForwarded(request)
    next(kept !== null && isHere ? undefined : notFound())
  }
}

const isForwarded = (request: Request): boolean => FORWARDED.some((name) => request.get(name) !== undefined)

function renderList(letters: KeptLetter[]): string {
  const shown = letters.map(({ id, to, from, replyTo, subject, text, receivedAt }) => `<article><h2>${escapeHtml(subject)}</h2>
<p>To ${escapeHtml(to.join(', '))} · from ${escapeHtml(from)}${replyTo === null ? '' : ` · answers to ${escapeHtml(replyTo)}`} · ${escapeHtml(receivedAt)} · <a href="/dev/mail/${escapeHtml(id)}">as HTML</a></p>
<pre>${withLinks(text)}</pre></article>`)
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>Drenchleaf: letters kept here</title><link rel="stylesheet" href="/dev/mail/style.css"></head><body><main><h1>Letters kept here</h1>
<p>No mail server is named (SMTP_URL), so letters go no further than this machine. Newest first.</p>
${shown.join('\n') || '<p>None yet.</p>'}</main></body></html>`
}

/** Text with its web addresses as links; cut at them first, so that each piece is escaped once. */
function withLinks(text: string): string {
  return text.split(/(https?:\/\/[^\s<>"]+)/).map((piece, index) => (index % 2 === 1 ? `<a href="${escapeHtml(piece)}">${escapeHtml(piece)}</a>` : escapeHtml(piece))).join('')
}

const STYLE = `body{background:#F7F4EC;color:#26302F;font:15px/22px system-ui,sans-serif;margin:0}main{max-width:820px;margin:0 auto;padding:32px 24px}
h1{font-size:30px;line-height:36px}h2{font-size:15px;margin:0;padding-top:8px;border-top:3px double #26302F}p{margin:4px 0;color:#5A4A3C}
article{margin:28px 0}a{color:#2B6A8F}pre{background:#EFEADC;padding:12px;white-space:pre-wrap;overflow-wrap:anywhere;font-size:13px;line-height:18px}`
