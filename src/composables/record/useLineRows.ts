import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { lineHolds } from '../../../shared/checks/labelHolds.ts'
import type { Block } from '../../../shared/contract/block.ts'
import { EACH } from '../../../shared/contract/each.ts'
import type { Part } from '../../../shared/contract/recordContent.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { lineCounts } from '../../../shared/records/lineCounts.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { endMoment, type LineDraft } from './lineDraft.ts'
import { countsOf, instantOf, numberOf, partOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import { readingUnit } from '../../../shared/units/readingUnit.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'
import { useFigures } from '../app/useFigures.ts'
import type { RecordStock } from './useRecordStock.ts'

/** How far the work on a line is. */
type LineState = 'waiting' | 'going' | 'done' | 'skipped'

/** One block line as the form shows it; empty texts where nothing is known yet. */
export interface LineRow {
  key: string
  line: LineDraft
  /** Its place in the record; −1 where it goes into none. */
  index: number
  block: Block | null
  state: LineState
  part: string
  /** "12 000 plants, 40 beds". */
  counts: string
  area: string
  /** The share of the mix, worked out, and its unit. */
  share: string
  shareUnit: string
  /** What is written of the amount, or the share: "474 L". */
  amount: string
  /** "19:36", and where it is not the day of the end, its day. */
  keepOut: string
  errors: Record<string, string>
}

interface LineRowsOptions {
  draft: Ref<RecordDraft>
  sheet: Ref<RecordSheet>
  stock: Ref<RecordStock>
  zone: Ref<string>
  errors: Ref<Record<string, string>>
}

function stateOf({ skipped, start, end }: LineDraft): LineState {
  if (skipped) return 'skipped'
  if (end.time !== '') return 'done'
  return start.time === '' ? 'waiting' : 'going'
}

/** Sentences of one line by the rest of their path: `part`, `counts.plant`, `startedAt`. */
function errorsOf(errors: Record<string, string>, index: number): Record<string, string> {
  const start = `lines.${index}.`
  return Object.fromEntries(Object.entries(errors).flatMap(([path, words]) => (path.startsWith(start) ? [[path.slice(start.length), words]] : [])))
}

/** What part of a block was treated, in words. */
function usePartWords(): (part: Part) => string {
  const { t } = useI18n()
  const { plain } = useFigures()
  return (part) => {
    switch (part.kind) {
      case 'whole':
        return t('records.where.whole')
      case 'fraction':
        return t('recordForm.part.fractionSays', { fraction: plain(part.fraction) })
      case 'drawn':
        return t('recordForm.part.drawnSays')
      default:
        return part.from === part.to
          ? t(`recordForm.part.${part.kind}One`, { from: part.from, of: part.of })
          : t(`recordForm.part.${part.kind}Says`, { from: part.from, to: part.to, of: part.of })
    }
  }
}

/** The block lines of the form in the person's language, with their figures and what follows from them. */
export function useLineRows({ draft, sheet, stock, zone, errors }: LineRowsOptions): ComputedRef<LineRow[]> {
  const { t } = useI18n()
  const figures = useFigures()
  const partWords = usePartWords()

  function countWords(line: LineDraft, part: Part): string {
    const counts = lineCounts({ counts: countsOf(line), part })
    return EACH.flatMap((each) => (counts[each] === undefined ? [] : [t(`recordForm.count.${each}`, { count: figures.plain(counts[each]) }, Number(counts[each]))])).join(', ')
  }

  function keepOutOf(line: LineDraft): string {
    const materials = draft.value.components.flatMap(({ materialId }) => stock.value.materials.filter(({ id }) => id === materialId))
    const end = instantOf(endMoment(line), zone.value)
    const endedAt = end?.ok ? end.instant : null
    const { reEntryUntil } = lineHolds({ endedAt }, materials, zone.value)
    const start = instantOf(line.start, zone.value)
    // An end before its start is asked about: nobody reads a keep-out from it.
    if (endedAt === null || reEntryUntil === null || (start?.ok === true && Date.parse(start.instant) > Date.parse(endedAt))) return ''
    const on = civilDateIn(zone.value, reEntryUntil)
    const time = civilTimeIn(zone.value, reEntryUntil)
    return on === civilDateIn(zone.value, endedAt) ? time : `${figures.dayShort(on)} ${time}`
  }

  function rowOf(line: LineDraft, index: number): LineRow {
    const block = stock.value.blocks.find(({ id }) => id === line.blockId) ?? null
    const part = partOf(line)
    const { shareL, shareKg, areaHa } = sheet.value.lines[index] ?? { shareL: null, shareKg: null, areaHa: null }
    const workedOutIn = shareL === null && shareKg !== null ? 'kg' : 'L'
    const share = figures.amount(shareL ?? shareKg, workedOutIn)
    const shareUnit = readingUnit(workedOutIn, figures.reader.value.units)
    const written = line.amount.known === 'workedOut' ? '' : line.amount.value.trim()
    return {
      key: line.key, line, index, block, share, shareUnit,
      state: stateOf(line),
      part: part === null ? t('recordForm.part.needed') : partWords(part),
      counts: countWords(line, part ?? { kind: 'whole' }),
      area: areaHa === null || part === null ? '' : figures.area(areaHa * M2_PER_HA),
      amount: written === '' ? (share === '' ? '' : `${share}\u00A0${figures.unit(shareUnit)}`) : `${figures.plain(numberOf(written)) || written}\u00A0${figures.unit(line.amount.unit)}`,
      keepOut: keepOutOf(line),
      errors: index < 0 ? {} : errorsOf(errors.value, index),
    }
  }

  return computed(() => {
    let next = 0
    return draft.value.lines.map((line) => rowOf(line, line.skipped ? -1 : next++))
  })
}
