import type { BlockLine, Counts, Part } from '../../../shared/contract/recordContent.ts'
import { EACH } from '../../../shared/contract/each.ts'
import { lineCounts } from '../../../shared/records/lineCounts.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import type { ReportWords } from './reportWords.ts'

/** What share of a block was treated, in words. */
export function partWords(part: Part, { say, short }: ReportWords): string {
  switch (part.kind) {
    case 'whole':
    case 'drawn':
      return say(`part.${part.kind}`)
    case 'fraction':
      return say('part.fraction', { percent: short(new ExactDecimal(part.fraction).times(100).toFixed()) })
    case 'rows':
    case 'beds': {
      const kind = part.from === part.to ? `${part.kind}One` : part.kind
      return say(`part.${kind}`, { from: part.from, to: part.to, of: part.of })
    }
  }
}

/** Counted and not drawn: nothing of it can be shown on a plan. */
export function isCounted({ kind }: Part): boolean {
  return kind === 'fraction' || kind === 'rows' || kind === 'beds'
}

/** "240 plants and 12 beds"; empty where nothing was counted. */
export function countWords(counts: Counts, { say, short, join }: ReportWords): string {
  return join(EACH.flatMap((each) => {
    const count = counts[each]
    return count === undefined ? [] : [say(`counts.${each}`, { count: short(count) }, Number(count))]
  }))
}

/** Counts written on a line, beds of its part among them unless the part says them already. */
export function lineCountWords(line: BlockLine, words: ReportWords): string {
  const { bed, ...rest } = lineCounts(line)
  return countWords(line.part.kind === 'beds' || bed === undefined ? rest : { ...rest, bed }, words)
}

/** Growth stage in plain words with its code; empty where neither was written. */
export function stageWords({ stage, bbch }: Pick<BlockLine, 'stage' | 'bbch'>, { say }: ReportWords): string {
  if (bbch === null) return stage ?? ''
  return stage === null ? say('stage.code', { bbch }) : say('stage.both', { stage, bbch })
}
