import { execFileSync } from 'node:child_process'
import { writeFileSync } from 'node:fs'
import { cpus, totalmem } from 'node:os'
import { parseArgs } from 'node:util'
import { measureGrowth, measureList, measureWrite, openRivals } from './figures/overHttp.ts'
import { measureLoad } from './figures/load.ts'
import { measureMap } from './figures/map.ts'
import { measurePdf, measurePdfMemory } from './figures/pdf.ts'
import { measureSign } from './figures/sign.ts'
import { openField } from './openField.ts'
import type { Summary } from './statistics.ts'

type FigureId = 'list' | 'growth' | 'write' | 'sign' | 'pdf' | 'pdfmem' | 'load' | 'map'

interface Figure extends Summary { id: FigureId; unit: string; goal: number }

/** Most that ours may take of what the baseline takes; of pages a second, the least that ours may give. */
const GOALS: Record<FigureId, number> = { list: 1.5, growth: 1.3, write: 1.6, sign: 2, pdf: 0.8, pdfmem: 1.1, load: 2.5, map: 1.3 }

const { values } = parseArgs({ options: { json: { type: 'string' }, only: { type: 'string', default: '' }, quick: { type: 'boolean', default: false } } })
const wanted = new Set(values.only.split(','))
const rounds = values.quick ? 7 : 25
const figures: Figure[] = []

function add(id: FigureId, unit: string, summary: Summary): void {
  figures.push({ id, ...summary, unit, goal: GOALS[id] })
  const [ratio, q1, q3, control] = [summary.ratio, summary.q1, summary.q3, summary.control].map((value) => value.toFixed(2))
  process.stdout.write(`${id.padEnd(7)} ${ratio} of the baseline (${q1} to ${q3}, n ${summary.n}), control ${control}${summary.noisy ? ', noisy' : ''}: ${summary.ours.toFixed(2)} to ${summary.baseline.toFixed(2)} ${unit}, goal ${GOALS[id]}\n`)
}

/** A figure without a clock: measured once. */
function addOnce(id: FigureId, unit: string, { ours, baseline }: { ours: number; baseline: number }): void {
  const ratio = ours / baseline
  add(id, unit, { ours, baseline, ratio, q1: ratio, q3: ratio, n: 1, control: 1, noisy: false })
}

async function measureServed(): Promise<void> {
  const field = await openField({ many: ['list', 'growth', 'write'].some((id) => wanted.has(id)) })
  const rivals = await openRivals(field)
  if (wanted.has('list')) add('list', 'ms', await measureList(rivals, { times: 20, rounds }))
  if (wanted.has('growth')) add('growth', 'ms', await measureGrowth(field, { times: 20, rounds }))
  if (wanted.has('write')) add('write', 'ms', await measureWrite(rivals, { times: 8, rounds }))
  if (wanted.has('sign')) add('sign', 'ms', await measureSign(field, { times: 4, rounds }))
  await rivals.close()
  await field.close()
}

if (['list', 'growth', 'write', 'sign'].some((id) => wanted.has(id))) await measureServed()
if (wanted.has('pdf')) add('pdf', 'pages/s', await measurePdf({ times: 1, rounds }))
if (wanted.has('pdfmem')) addOnce('pdfmem', 'MB', measurePdfMemory())
if (wanted.has('load')) addOnce('load', 'kB gz', await measureLoad())
if (wanted.has('map')) add('map', 'ms', await measureMap({ times: 1, rounds }))
if (values.json !== undefined) writeFileSync(values.json, `${JSON.stringify({ commit: commitOf(), machine: machineOf(), figures }, null, 2)}\n`)
process.exit(0)

function commitOf(): string {
  try {
    return execFileSync('git', ['rev-parse', 'HEAD'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }).trim()
  } catch {
    return 'unknown' // an unpacked archive has no history
  }
}

function machineOf(): string {
  const all = cpus()
  return `${all.length} × ${all[0]?.model.trim() ?? 'unknown processor'}, ${Math.round(totalmem() / 2 ** 30)} GiB, Node.js ${process.versions.node}, ${process.platform}`
}
