import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { BlockPlan, PlanBlock } from '../parts/planTypes.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { pairBlocks, type PairedLine } from './pairBlocks.ts'
import { isCounted, partWords } from './partWords.ts'
import type { ReportWords } from './reportWords.ts'

/** The plan of the treated blocks, with the words around it. Several lines on one block are one block of the plan. */
export function planOf({ signed, neighbours, ground, sites, language }: RecordReportData, words: ReportWords): BlockPlan {
  const { say } = words
  const lines = pairBlocks(signed)
  const ids = [...new Set(lines.map(({ block }) => block.id))]
  const scaleOf = (denominator: number): string => formatNumber(denominator, {}, language)
  const named = words.join(lines.map(({ block: { code }, areaM2, line: { part } }) => {
    const params = { code, hectares: words.hectares(areaM2), part: partWords(part, words) }
    return say(part.kind === 'whole' ? 'plan.block' : isCounted(part) ? 'plan.blockCounted' : 'plan.blockPart', params)
  }))
  return {
    blocks: ids.map((id) => planBlock(lines.filter(({ block }) => block.id === id), words)),
    neighbours, ground, sites, method: signed.content.method, language,
    words: {
      north: say('plan.north'),
      scale: (denominator) => say('plan.scale', { denominator: scaleOf(denominator) }),
      alt: (denominator) => {
        const plan = say('plan.alt', { denominator: scaleOf(denominator), blocks: named })
        if (neighbours.length === 0) return plan
        return say('plan.altNeighbours', { plan, neighbours: words.join(neighbours.map(({ code }) => code)) })
      },
    },
  }
}

function planBlock(lines: PairedLine[], words: ReportWords): PlanBlock {
  const [first] = lines
  if (!first) throw new RangeError('a block of the plan has no line')
  const treatedM2 = lines.reduce((sum, { areaM2 }) => sum + Number(areaM2), 0)
  const counted = lines.filter(({ line: { part } }) => isCounted(part))
  const isWhole = lines.some(({ line: { part } }) => part.kind === 'whole')
  return {
    code: first.block.code,
    geometry: first.block.geometry,
    treated: isWhole ? 'whole' : lines.flatMap(({ line: { part } }) => (part.kind === 'drawn' ? [part.geometry] : [])),
    notes: [
      words.say('plan.treated', { hectares: words.hectares(treatedM2) }),
      ...(counted.length === 0 ? [] : words.say('plan.notDrawn').split('\n')),
    ],
  }
}
