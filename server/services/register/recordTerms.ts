import type { RecordState } from '../../../shared/contract/record.ts'
import type { Review } from '../../../shared/contract/register.ts'
import { PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'
import { wordsToFindBy } from '../../../shared/register/foldWords.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'

/** What a record can be found by exactly; a word also by how it begins. The doer's name is looked up among the people. */
export const TERM = {
  block: (id: string) => `b:${id}`,
  material: (id: string) => `i:${id}`,
  person: (id: string) => `p:${id}`,
  method: (method: string) => `m:${method}`,
  state: (state: RecordState) => `s:${state}`,
  /** Of signed records alone: whether somebody has read the version that stands. */
  review: (review: Review) => `r:${review}`,
  word: (word: string) => `w:${word}`,
}

/** Every term of a record whose version that stands is just written, so that nobody has read it yet. @param blockNames names of its blocks as they stand now. */
export function recordTerms(record: Pick<ApplicationRecord, 'state' | 'content' | 'doneById' | 'registerRow'>, blockNames: readonly string[]): string[] {
  const { content, registerRow: row } = record
  const written = [row.number, ...PLAIN_FIELDS.map(({ name }) => content[name]), ...row.blocks.map(({ code }) => code), ...blockNames, ...row.preparations, ...row.lots]
  return [...new Set([
    TERM.state(record.state),
    ...(record.state === 'signed' ? [TERM.review('waiting')] : []),
    TERM.method(content.method),
    TERM.person(record.doneById),
    ...content.lines.map(({ blockId }) => TERM.block(blockId)),
    ...content.components.map(({ materialId }) => TERM.material(materialId)),
    ...written.flatMap((text) => (text === null ? [] : wordsToFindBy(text).map(TERM.word))),
  ])]
}
