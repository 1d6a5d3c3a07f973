import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { BlockPlan } from '../parts/blockPlan.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { pairBlocks } from './blockLines.ts'
import type { ReportWords } from './reportWords.ts'

/** The plan of the treated blocks, with the words around it. */
export function planOf({ signed, neighbours, sites, language }: RecordReportData, words: ReportWords): BlockPlan {
  const { say } = words
  const blocks = pairBlocks(signed).map(({ block }) => block)
  const scaleOf = (denominator: number): string => formatNumber(denominator, {}, language)
  const named = words.join(blocks.map(({ code, areaM2 }) => say('plan.block', { code, hectares: words.hectares(areaM2) })))
  return {
    blocks: blocks.map(({ code, geometry, areaM2 }) => ({
      code, geometry, note: say('plan.treated', { hectares: words.hectares(areaM2) }),
    })),
    neighbours, sites, method: signed.content.method, language,
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
