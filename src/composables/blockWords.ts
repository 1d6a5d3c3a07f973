import type { Block } from '../../shared/contract/block.ts'
import { renderMessage } from '../../shared/messages/renderMessage.ts'
import { translate, type Language } from '../../shared/messages/translate.ts'
import { formatHectares, formatNumber } from '../../shared/units/formatQuantity.ts'

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

/** Figures of a block in a person's language: hectares to 2 decimals (4 under 0.01 ha), metres whole. */
export function blockWords(language: Language, block: Block): BlockWords {
  const areaFigure = hectaresText(language, block.areaM2)
  return {
    ...block,
    areaFigure,
    areaText: translate(language, 'blocks.hectares', { figure: areaFigure }),
    perimeterText: metresText(language, block.perimeterM),
    spoken: renderMessage(language, { id: 'blocks.spoken', params: { code: block.code, name: block.name, area: areaFigure } }),
  }
}

const SMALL_M2 = 100

/** Hectares of an area in square metres; small ones keep 4 decimals, a square metre. */
export function hectaresText(language: Language, areaM2: number): string {
  return formatHectares(areaM2, language, areaM2 < SMALL_M2 ? 4 : 2)
}

/** "414 m". */
export function metresText(language: Language, metres: number): string {
  return translate(language, 'blocks.page.metres', { figure: formatNumber(metres, { digits: 0 }, language) })
}
