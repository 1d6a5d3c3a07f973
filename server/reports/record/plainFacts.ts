import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'
import type { Fact } from '../parts/factsList.ts'
import { plain, type ReportWords } from './reportWords.ts'

/** The short plain fields of a record that belong to a step of it. */
export function plainFacts(content: RecordContent, step: (typeof PLAIN_FIELDS)[number]['step'], words: ReportWords): Fact[] {
  return PLAIN_FIELDS.filter((field) => !field.isLong && field.step === step).map(({ name }) => ({
    label: words.plainLabel(name), spans: plain(content[name] ?? words.plainNone(name)),
  }))
}
