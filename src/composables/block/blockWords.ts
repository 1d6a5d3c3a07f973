import type { Block } from '../../../shared/contract/block.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { readingUnit } from '../../../shared/units/readingUnit.ts'
import { areaFor, quantityFor, unitFor, type Reader } from '../../../shared/messages/readFigure.ts'

/** A block with its figures in words, as list and map show it. */
export interface BlockWords extends Block {
  /** "0.93 ha". */
  areaText: string
  /** "0.93". */
  areaFigure: string
  /** "414 m". */
  perimeterText: string
  /** "A3, Long Bank 3, 0.93 ha": said when the block is chosen. */
  spoken: string
}

/** Figures of a block as a person reads them: areas to 2 decimals (4 under 100 m²), lengths whole. */
export function blockWords(reader: Reader, block: Block): BlockWords {
  const areaFigure = areaText(reader, block.areaM2)
  return {
    ...block,
    areaFigure,
    areaText: areaWords(reader, block.areaM2),
    perimeterText: lengthWords(reader, block.perimeterM),
    spoken: spokenWords(reader, { code: block.code, name: block.name, area: areaFigure }),
  }
}

/** "A3, Long Bank 3, 0.93 ha". @param area its figure. */
export function spokenWords(reader: Reader, { code, name, area }: { code: string; name: string; area: string }): string {
  return renderMessage(reader.language, { id: 'blocks.spoken', params: { code, name, area, areaUnit: readingUnit('ha', reader.units) } })
}

const SMALL_M2 = 100

/** The figure of an area in square metres; a small one keeps 4 decimals. */
export function areaText(reader: Reader, areaM2: number): string {
  return areaFor(reader, areaM2, areaM2 < SMALL_M2 ? 4 : 2)
}

/** "0.93 ha". */
export function areaWords(reader: Reader, areaM2: number): string {
  return `${areaText(reader, areaM2)}\u00A0${unitFor(reader, 'ha')}`
}

/** "414 m". */
export function lengthWords(reader: Reader, metres: number): string {
  return quantityFor(reader, metres, 'm', { digits: 0 })
}
