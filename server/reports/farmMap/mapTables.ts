import { totalAreaM2 } from '../../../shared/geo/totalAreaM2.ts'
import { translate } from '../../../shared/messages/translate.ts'
import { formatHectares, formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { FarmMapData } from '../farmMapReportData.ts'
import type { Canvas } from '../parts/canvas.ts'
import type { Column, Table, TableRow } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import type { Say } from '../register/say.ts'

const { body, bodyBold } = STYLES
const cell = (text: string, isBold = false): TableRow['cells'][number] => (text === '' ? [] : [{ text, style: isBold ? bodyBold : body }])
const common = { leading: body.leading, padding: 2.4, showsHeads: true } as const

/** The blocks with their areas as drawn, and the sum. */
export function blockTable({ frame }: Canvas, { blocks, language }: FarmMapData, say: Say): Table {
  const rows = blocks.map(({ code, name, crop, areaM2 }): TableRow => ({
    hasHead: true, cells: [cell(code, true), cell(name), cell(crop ?? ''), cell(formatHectares(areaM2, language))],
  }))
  const total: TableRow = { isTotal: true, hasHead: true, cells: [cell(say('total'), true), [], [], cell(formatHectares(totalAreaM2(blocks), language), true)] }
  return { ...common, x: frame.left, columns: columnsOf(frame.width, say, ['block', 'name', 'crop', 'ha'], [0.13, 0.37, 0.37, 0.13], 3), rows: [...rows, total] }
}

/** What is kept clear of, each with its distance or that none is written down. */
export function siteTable({ frame }: Canvas, { sites, language }: FarmMapData, say: Say): Table {
  return {
    ...common, x: frame.left, columns: columnsOf(frame.width, say, ['site', 'kind', 'note', 'keepClear'], [0.3, 0.2, 0.33, 0.17], 3),
    rows: sites.map(({ name, kind, note, keepClearM }): TableRow => ({
      hasHead: true,
      cells: [cell(name, true), cell(translate(language, `ground.siteKind.${kind}`)), cell(note ?? ''), cell(keepClearM === null ? say('noDistance') : formatNumber(keepClearM, {}, language))],
    })),
  }
}

function columnsOf(width: number, say: Say, names: readonly string[], shares: readonly number[], figure: number): Column[] {
  return names.map((name, index) => ({
    head: say(`column.${name}`), width: width * (shares[index] ?? 0), ...(index === figure && { align: 'right' as const, opensAccount: true }),
  }))
}
