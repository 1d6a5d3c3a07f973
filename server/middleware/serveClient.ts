import { join } from 'node:path'
import express, { Router } from 'express'
import { notFound } from '../errors.ts'

/** The built client: hashed files for ever, its one page for every place; unknown files are 404, never the page. */
export function serveClient(folder: string): Router {
  const router = Router()
  router.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }))
  router.use(express.static(folder, { index: false, maxAge: 0 }))
  router.get('/*place', sendPage)
  router.get('/', sendPage)
  return router

  function sendPage(request: express.Request, response: express.Response): void {
    const last = request.path.slice(request.path.lastIndexOf('/') + 1)
    if (last.includes('.')) throw notFound()
    response.set('Cache-Control', 'no-cache').sendFile(join(folder, 'index.html'))
  }
}
