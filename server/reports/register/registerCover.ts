import { translate } from '../../../shared/messages/translate.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { addElement, type Element } from '../parts/canvas.ts'
import { drawDoubleRule } from '../parts/drawRules.ts'
import { drawFacts, type Fact } from '../parts/factsList.ts'
import type { Flow } from '../parts/pageFlow.ts'
import { drawParagraph } from '../parts/paragraph.ts'
import { drawText, measureText } from '../parts/setText.ts'
import { ELDER, STYLES } from '../parts/styles.ts'
import type { RegisterReportData } from '../registerReportData.ts'
import type { Say } from './say.ts'

interface CoverWords { data: RegisterReportData; say: Say; seasons: string }

const TITLE = { ...STYLES.stamp, size: 30, leading: 34, color: ELDER }

/** The head of a volume: what it is, which volume, what was chosen, what it adds up to, how to read it. */
export function drawRegisterCover(flow: Flow, part: Element, { data, say, seasons }: CoverWords): void {
  const { canvas } = flow
  const { left, right, width } = canvas.frame
  const { volume, volumes } = data
  addElement(canvas, part, 'H1', () => drawText(canvas, say('title'), { x: left - 1, y: flow.y }, TITLE))
  const beside = volumes === 1 ? seasons : `${seasons}, ${say('volume', { volume, volumes })}`
  addElement(canvas, part, 'P', () => drawText(canvas, beside, { x: right - measureText(canvas, beside, STYLES.method), y: flow.y + 15 }, STYLES.method))
  flow.y += TITLE.leading + 3
  flow.y += drawDoubleRule(canvas, { x: left, y: flow.y, width }, [2.2, 0.6]) + 6
  drawFacts(flow, part, { facts: [...chosenFacts(data, say), ...sumFacts(data, say)], box: { x: left, width, labelWidth: 110 } })
  flow.y += 4
  const note = [say('note', { page: data.checkPage }), say('zone', { zone: data.farm.zone })].join(' ')
  drawParagraph(flow, part, note, STYLES.note)
  flow.y += 6
  if (data.rows.length === 0) drawParagraph(flow, part, say('empty'), STYLES.head)
}

function chosenFacts({ filter, names, sort, language }: RegisterReportData, say: Say): Fact[] {
  const print = (id: string) => translate(language, `registerPrint.${id}`)
  const chosen: [string, string | number | null | undefined][] = [
    ['season', filter.season], ['block', names.block], ['method', filter.method && print(`method.${filter.method}`)], ['material', names.material],
    ['person', names.person], ['state', filter.state && print(`state.${filter.state}`)], ['review', filter.review && print(`review.${filter.review}`)], ['q', filter.q],
  ]
  const words = chosen.flatMap(([name, value]) => (value === undefined || value === null ? [] : [`${say(`filter.${name}`)}: ${value}`]))
  const key = say(`sort.${sort.replace('-', '')}`)
  return [
    fact(say('filter.label'), words.length === 0 ? say('filter.none') : words.join('; ')),
    fact(say('filter.order'), say(sort.startsWith('-') ? 'sort.down' : 'sort.up', { key })),
  ]
}

function sumFacts({ totals, rows, language }: RegisterReportData, say: Say): Fact[] {
  const count = (value: number) => formatNumber(value, { digits: 0 }, language)
  const text = say('countedText', { records: count(totals.records), areaHa: formatNumber(totals.areaHa, { digits: 2 }, language), totalL: formatNumber(totals.totalL, { digits: 0 }, language) }, totals.records)
  const hasKilograms = /[1-9]/.test(totals.totalKg)
  return [
    fact(say('counted'), hasKilograms ? say('kilograms', { text, totalKg: formatNumber(totals.totalKg, { digits: 0 }, language) }) : text),
    fact(say('left'), say('leftText', { withdrawn: count(totals.withdrawn), unsigned: count(totals.unsigned) })),
    fact(say('late'), say('lateText', { late: count(totals.late), records: count(totals.records) })),
    fact(say('rows'), say('rowsText', { rows: count(rows.length), found: count(totals.found) })),
  ]
}

const fact = (label: string, text: string): Fact => ({ label, spans: [{ text, style: STYLES.body }] })
