import type { Computed, RegisterRow } from '../contract/record.ts'
import type { Method, RecordContent } from '../contract/recordContent.ts'
import { civilDateIn } from '../time/civilDate.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import type { BlockSummary, SeasonFigures, SeasonSummary } from './summaryTypes.ts'
import { M2_PER_HA } from '../units/hectare.ts'
import { compareCodes } from '../records/compareCodes.ts'
import { landShares } from '../records/landFigures.ts'

const WEEK_HOURS = 7 * 24

/** What of a record the summary adds up. */
export interface SummarisedRecord {
  state: 'signed' | 'withdrawn'
  row: Omit<RegisterRow, 'id' | 'state'>
  content: Pick<RecordContent, 'lines'>
  computed: Pick<Computed, 'totalL' | 'totalKg' | 'lines'>
}

/** A summary that records are added to one by one, so that no more than the blocks and their marks is held. */
export interface OpenSummary {
  add(record: SummarisedRecord): void
  finish(): SeasonSummary
}

/** What one block got of one record. */
interface Pass { key: string; code: string; areaHa: string; litres: string; kg: string; isMeasured: boolean; on: string | null }

/**
 * Adds up the records of a season: by block, and as shares each of how many. Withdrawn records are counted and add nothing. A record
 * of several blocks is one pass on each. @param zone IANA name; days are those of the farm.
 */
export function openSeasonSummary(zone: string): OpenSummary {
  const blocks = new Map<string, BlockSummary>()
  const figures: SeasonFigures = { signed: 0, withdrawn: [], first: null, last: null, from: null, to: null, stops: 0, late: 0, veryLate: 0, unknown: 0, areaHa: '0', litres: '0', litresMeasured: '0', kg: '0' }
  return {
    add(record) {
      if (record.state === 'withdrawn') {
        figures.withdrawn.push(record.row.number ?? '')
        return
      }
      count(figures, record.row)
      for (const pass of passesOf(record, zone)) {
        addPass(blocks, pass, record.row.method)
        figures.areaHa = plus(figures.areaHa, pass.areaHa)
        figures.litres = plus(figures.litres, pass.litres)
        figures.kg = plus(figures.kg, pass.kg)
        if (pass.isMeasured) figures.litresMeasured = plus(figures.litresMeasured, pass.litres)
        if (pass.on !== null) spread(figures, pass.on)
      }
    },
    finish: () => ({ figures, blocks: [...blocks.values()].sort((one, other) => compareCodes(one.code, other.code)) }),
  }
}

function count(figures: SeasonFigures, { number, tally, lateHours }: SummarisedRecord['row']): void {
  figures.signed += 1
  if (number !== null && (figures.first === null || number < figures.first)) figures.first = number
  if (number !== null && (figures.last === null || number > figures.last)) figures.last = number
  if (tally.stop > 0) figures.stops += 1
  if (tally.unknown > 0) figures.unknown += 1
  if (lateHours !== null) figures.late += 1
  if (lateHours !== null && lateHours >= WEEK_HOURS) figures.veryLate += 1
}

/** Records of the first schema kept no shares of their lines: with one block it got all, with several nobody knows. */
function passesOf({ row, content, computed }: SummarisedRecord, zone: string): Pass[] {
  const dayOf = (at: string | null) => (at === null ? null : civilDateIn(zone, at))
  const isShared = computed.lines.length === content.lines.length
  if (!isShared && content.lines.length !== 1) {
    const on = dayOf(row.startedAt)
    return [{ key: '', code: '', areaHa: row.areaHa, litres: row.totalL ?? '0', kg: row.totalKg ?? '0', isMeasured: false, on }]
  }
  const onLand = landShares(content.lines, computed)
  return content.lines.map((line, index) => {
    const share = computed.lines[index]
    return {
      key: line.blockId,
      code: row.blocks.find(({ id }) => id === line.blockId)?.code ?? '',
      areaHa: share === undefined ? row.areaHa : new ExactDecimal(share.areaM2).div(M2_PER_HA).toFixed(),
      litres: (share === undefined ? row.totalL : onLand[index]?.litres) ?? '0',
      kg: (share === undefined ? row.totalKg : onLand[index]?.kg) ?? '0',
      isMeasured: line.amount?.known === 'measured',
      on: dayOf(line.startedAt ?? row.startedAt),
    }
  })
}

function addPass(blocks: Map<string, BlockSummary>, { key, code, areaHa, litres, kg, on }: Pass, method: Method): void {
  const block = blocks.get(key) ?? { blockId: key, code, foliar: 0, drench: 0, solid: 0, areaHa: '0', litres: '0', kg: '0', marks: [], lastOn: null }
  blocks.set(key, block)
  if (method === 'foliar') block.foliar += 1
  else if (method === 'solid') block.solid += 1
  else block.drench += 1
  block.areaHa = plus(block.areaHa, areaHa)
  block.litres = plus(block.litres, litres)
  block.kg = plus(block.kg, kg)
  if (on === null) return
  block.marks.push({ method, on })
  if (block.lastOn === null || on > block.lastOn) block.lastOn = on
}

function spread(figures: SeasonFigures, on: string): void {
  if (figures.from === null || on < figures.from) figures.from = on
  if (figures.to === null || on > figures.to) figures.to = on
}

const plus = (one: string, other: string): string => new ExactDecimal(one).plus(other).toFixed()
