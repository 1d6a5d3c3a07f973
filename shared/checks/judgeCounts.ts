import type { Check } from '../contract/record.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { RecordFacts } from './recordFacts.ts'

/** Block lines that lack the count which the mix is sized or measured by: their share cannot be known. */
export function judgeCounts({ content, sheet, blocks }: RecordFacts): Check[] {
  const lacking = new Set(sheet.findings.flatMap(({ code, path }) => (code === 'sheet.count_needed' && path !== undefined ? [Number(path.split('.')[1])] : [])))
  return [...lacking].map((index) => {
    const code = blocks.find(({ id }) => id === content.lines[index]?.blockId)?.code ?? ''
    return buildCheck({
      code: 'mix.counts', verdict: 'unknown', rests: 'recipe', about: `line:${index}`,
      title: words('checks.counts.title', { code }), text: words('checks.counts.text'),
    })
  })
}
