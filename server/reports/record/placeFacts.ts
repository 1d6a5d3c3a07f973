import type { Fact } from '../parts/factsList.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { BLOCKS_IN_FACTS, hasHolds, oneStage } from './blockLines.ts'
import { stageWords } from './partWords.ts'
import { plainFacts } from './plainFacts.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** What was treated, and for what. */
export function placeFacts({ signed }: RecordReportData, words: ReportWords): Fact[] {
  const { say } = words
  const { blocks, content } = signed
  const isMany = blocks.length > BLOCKS_IN_FACTS
  const crops = [...new Set(blocks.map(({ crop }) => crop ?? say('facts.noCrop')))]
  const named = blocks.flatMap(({ code, name }, index) => {
    const separator = index === 0 ? '' : index === blocks.length - 1 ? say('list.and', { first: '', last: '' }) : say('list.next', { first: '', last: '' })
    return [...plain(separator), ...bold(code), ...plain(` ${name}`)]
  })
  const versions = words.join(blocks.map(({ code, version }) => say('facts.boundary', { code, version })))
  return [
    { label: say('facts.blocks'), spans: isMany ? plain(say('facts.manyBlocks', { count: blocks.length })) : named },
    ...(isMany ? [] : [{ label: say('facts.crop'), spans: plain(words.join(crops)) }]),
    { label: say('facts.stage'), spans: plain(stageOf(signed, words)) },
    ...plainFacts(content, 'ready', words),
    ...(content.method === 'solid' ? [{ label: say('facts.workedIn'), spans: plain(content.workedInOn === null ? say('facts.notWritten') : words.civilDay(content.workedInOn)) }] : []),
    { label: say('facts.boundaries'), spans: plain(isMany ? say('facts.manyBoundaries') : versions) },
    ...(hasHolds(signed) ? [] : [{ label: say('facts.holds'), spans: plain(say(signed.computed.lines.length === 0 ? 'facts.holdsOld' : 'facts.noHolds')) }]),
    { label: say('facts.zone'), spans: plain(signed.farm.zone.replaceAll('_', ' ')) },
  ]
}

function stageOf(signed: RecordReportData['signed'], words: ReportWords): string {
  const stage = oneStage(signed)
  if (stage === null) return words.say('facts.byLine')
  return stageWords(stage, words) || words.say('facts.notWritten')
}
