import type { Amount, KnownAmount } from '../../../shared/contract/quantity.ts'
import { usedAgainstPlanned } from '../../../shared/mix/usedAgainstPlanned.ts'
import type { TableRow } from '../parts/ledgerTable.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** What was really taken of an ingredient, under what the sheet worked out, with how far apart they are. */
export function usedRow({ used, planned, columns }: { used: KnownAmount; planned: Amount; columns: number }, words: ReportWords): TableRow {
  const { say } = words
  const apart = usedAgainstPlanned(used, planned)
  const params = apart && { amount: words.worked(apart.difference, apart.unit), percent: words.amount(apart.percent) }
  const difference = params ? say(`mix.used.${apart.direction}`, params) : say('mix.used.other')
  const cells = [plain(say('mix.used.really', { known: say(`known.${used.known}`), difference })), [], [], [], bold(words.quantity(used.value, used.unit))]
  return { hasHead: true, runsOver: { column: 0, columns: 4 }, cells: [...cells, ...Array.from({ length: columns - cells.length }, () => [])] }
}
