import type { RecordContent } from '../contract/recordContent.ts'
import { partArea } from '../geo/partArea.ts'
import { recordSheet } from '../mix/recordSheet.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'
import { lineCounts } from './lineCounts.ts'

export interface SheetGround {
  /** Area of a block as it stands for this record, square metres; anything text or number that says one. */
  blocks: readonly { id: string; areaM2: string | number }[]
  sprayer: { tankL: string; flowLPerMin: string | null } | null
}

/** The sheet of what was written, over the ground it rests on: the one way from a record to its figures. */
export function sheetOf(content: Pick<RecordContent, 'method' | 'lines' | 'water' | 'components'>, { blocks, sprayer }: SheetGround): RecordSheet {
  return recordSheet({
    lines: content.lines.map((line) => ({
      areaM2: partArea(line.part, Number(blocks.find(({ id }) => id === line.blockId)?.areaM2 ?? 0)),
      counts: lineCounts(line),
      amount: line.amount,
    })),
    isDry: content.method === 'solid',
    water: content.water,
    tankL: sprayer?.tankL ?? null,
    flowLPerMin: sprayer?.flowLPerMin ?? null,
    components: content.components,
  })
}
