import connectPgSimple from 'connect-pg-simple'
import express from 'express'
import session from 'express-session'
import pg from 'pg'
import type { Recorded } from '../../support/recordStatements.ts'
import { replay } from './replay.ts'

/** What the bare server is told: the statements of ours, and what cannot be read from their rows. */
export interface BarePlan {
  list: Recorded[]
  write: Recorded[]
  /** Ids that stay as they are. */
  known: string[]
  /** The record that was written while the statements were recorded, and its answer. */
  writtenId: string
  writtenAnswer: object
}

// Bare Express and pg: the same session middleware, the same statements as the same role, one connection at a time.
const plan = JSON.parse(process.env['BENCH_PLAN'] ?? '') as BarePlan
const databaseUrl = process.env['DATABASE_URL'] ?? ''
const known = new Set<unknown>(plan.known)
const pool = new pg.Pool({ connectionString: databaseUrl, max: 10 })
const Store = connectPgSimple(session)
const app = express()
app.use(express.json({ limit: '1mb' }))
app.use(session({
  name: 'drenchleaf.sid', secret: process.env['SESSION_SECRET'] ?? '', resave: false, saveUninitialized: false,
  store: new Store({ conObject: { connectionString: databaseUrl, max: 2 }, tableName: 'sessions', disableTouch: true, pruneSessionInterval: false }),
}))

app.get('/api/farms/:farmId/records', async (_request, response) => {
  const client = await pool.connect()
  const rows = await replay(client, plan.list, known, new Map())
  client.release()
  const items = rows.slice(0, 50).map(({ record_id: id, state, register_row: row }) => ({ id, state, ...row }))
  response.json({ items })
})

app.post('/api/farms/:farmId/records', async (request, response) => {
  const { id } = request.body as { id: string }
  const client = await pool.connect()
  await replay(client, plan.write, known, new Map([[plan.writtenId, id]]))
  client.release()
  response.status(201).json({ ...plan.writtenAnswer, id })
})

const server = app.listen(0, '127.0.0.1', () => {
  const address = server.address()
  process.stdout.write(`READY ${JSON.stringify({ url: `http://127.0.0.1:${typeof address === 'object' ? address?.port : ''}` })}\n`)
})
