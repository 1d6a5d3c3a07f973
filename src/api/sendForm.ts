import { NetworkError } from './errors.ts'

/** An upload may take long where the signal is weak; one that stands still this long is none. */
const STALL_MS = 30_000

/** Sends one form, telling how much of it has gone: a share from 0 to 1. @throws {NetworkError} when no answer came. */
export function sendForm(path: string, form: FormData, onProgress: (share: number) => void): Promise<Response> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    let timer = window.setTimeout(() => request.abort(), STALL_MS)
    const again = (): void => { window.clearTimeout(timer); timer = window.setTimeout(() => request.abort(), STALL_MS) }
    const fail = (): void => { window.clearTimeout(timer); reject(new NetworkError()) }
    request.upload.onprogress = ({ lengthComputable, loaded, total }) => { again(); if (lengthComputable) onProgress(loaded / total) }
    request.onload = () => { window.clearTimeout(timer); resolve(responseOf(request)) }
    request.onerror = fail
    request.onabort = fail
    request.open('POST', `/api${path}`)
    request.setRequestHeader('Accept', 'application/json')
    request.setRequestHeader('Accept-Language', document.documentElement.lang)
    request.setRequestHeader('X-Requested-With', 'drenchleaf')
    request.send(form)
  })
}

function responseOf(request: XMLHttpRequest): Response {
  const wait = request.getResponseHeader('Retry-After')
  return new Response(request.responseText, { status: request.status, headers: wait === null ? {} : { 'Retry-After': wait } })
}
