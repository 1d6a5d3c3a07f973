import type { Message } from '../contract/common.ts'
import { roundForReader } from '../checks/roundForReader.ts'
import { readingUnit, type UnitSystem } from '../units/readingUnit.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { figureIn } from './readFigure.ts'

/** Params of a message that were worked out in one unit, and the param by which its words name that unit. */
interface WorkedOut { params: readonly string[]; unit: UnitCode | 'asNamed'; named: string; limits?: readonly string[]; digits?: number }

const AREA: WorkedOut = { params: ['areaHa', 'hectares'], unit: 'ha', named: 'areaUnit' }
/** By the start of the message's id. What is held against a label or a lot stays in the unit of the label or the lot. */
const WORKED_OUT: Readonly<Record<string, readonly WorkedOut[]>> = {
  'checks.wind.': [{ params: ['low', 'high', 'value'], unit: 'ms', named: 'unit', limits: ['low', 'high'] }],
  'checks.deltaT.': [{ params: ['low', 'high', 'value'], unit: 'diffC', named: 'unit', limits: ['low', 'high'] }],
  'checks.calibration.': [{ params: ['planned', 'rate'], unit: 'L/ha', named: 'unit' }],
  'checks.labelStrength.': [{ params: ['part', 'total'], unit: 'L', named: 'volumeUnit' }],
  'likely.time.': [{ params: ['value'], unit: 'asNamed', named: 'unit' }, { params: ['flow'], unit: 'L', named: 'flowUnit' }],
  'likely.applied.': [{ params: ['applied', 'total', 'rest'], unit: 'asNamed', named: 'unit' }],
  'likely.reading.': [{ params: ['low', 'high'], unit: 'asNamed', named: 'limitUnit' }],
  'versions.figure.': [{ params: ['value'], unit: 'asNamed', named: 'unit', digits: 6 }],
  'versions.part.': [AREA],
  'problems.geometry.': [AREA, { params: ['km'], unit: 'km', named: 'farUnit' }, { params: ['areaM2'], unit: 'm2', named: 'groundUnit' }],
}
const DIGITS = 3

/**
 * A message with its worked-out figures in the measures of a reader, to three digits, or as many more as it takes to look different from a
 * limit beside it; every other message as it is.
 */
export function messageFor(message: Message, system: UnitSystem): Message {
  const [, found] = Object.entries(WORKED_OUT).find(([start]) => message.id.startsWith(start)) ?? []
  return (found ?? []).reduce((read, each) => turn(read, each, system), message)
}

function turn(message: Message, { params, unit: workedOutIn, named, limits: ends = [], digits = DIGITS }: WorkedOut, system: UnitSystem): Message {
  const unit = workedOutIn === 'asNamed' ? (message.params[named] as UnitCode) : workedOutIn
  if (readingUnit(unit, system) === unit) return message
  const read = (name: string): string[] => {
    const value = message.params[name]
    return value === undefined ? [] : [figureIn(value, unit, system)]
  }
  const limits = ends.flatMap(read)
  const figures = params.flatMap((name) => read(name).map((value) => [name, roundForReader(value, ends.includes(name) ? [] : limits, digits)]))
  return figures.length === 0 ? message : { id: message.id, params: { ...message.params, ...Object.fromEntries(figures), [named]: readingUnit(unit, system) } }
}
