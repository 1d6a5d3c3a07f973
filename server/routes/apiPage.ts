import { escapeHtml } from '../escapeHtml.ts'
import type { OpenApi } from './openApi.ts'

/** The API as a page to read: each route with its roles, what it takes and gives. */
export function renderApiPage(api: OpenApi): string {
  const routes = Object.entries(api.paths).flatMap(([path, operations]) =>
    Object.entries(operations).map(([method, operation]) => {
      const roles = typeof operation['x-roles'] === 'string' ? operation['x-roles'] : operation['x-roles'].join(', ')
      return `<section><h2><code>${method.toUpperCase()} /api${escapeHtml(path)}</code></h2><p>${escapeHtml(operation.summary)}</p>
<p>For: ${escapeHtml(roles)}</p>${show('Parameters', operation.parameters)}${show('Takes', operation.requestBody)}${show('Gives', giving(operation.responses))}</section>`
    }),
  )
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>Drenchleaf: the API</title><link rel="stylesheet" href="/api/docs.css"></head><body><main><h1>Drenchleaf: the API</h1>
<p>The same as <a href="/api/openapi.json">OpenAPI 3.1</a>. Every unsafe request carries <code>X-Requested-With: drenchleaf</code>;
problems are RFC 9457; lists answer <code>{items, next}</code>.</p>${routes.join('\n')}</main></body></html>`
}

export const API_PAGE_STYLE = `body{background:#F7F4EC;color:#26302F;font:15px/22px system-ui,sans-serif;margin:0}
main{max-width:940px;margin:0 auto;padding:32px 24px}h1{font-size:30px;line-height:36px}h2{font-size:15px;margin:0 0 4px;padding-top:8px;border-top:3px double #26302F}
section{margin:24px 0}p{margin:4px 0}a{color:#2B6A8F}summary{color:#5A4A3C;cursor:pointer}pre{background:#EFEADC;padding:12px;overflow:auto;font-size:13px;line-height:18px}`

function giving(responses: Record<string, object>): object {
  return Object.fromEntries(Object.entries(responses).filter(([status]) => status.startsWith('2')))
}

function show(title: string, value: unknown): string {
  if (value === undefined || (Array.isArray(value) && value.length === 0)) return ''
  return `<details><summary>${title}</summary><pre>${escapeHtml(JSON.stringify(value, null, 2))}</pre></details>`
}
