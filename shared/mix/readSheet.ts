import { EACH, type Each } from '../contract/each.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { countsOf, sumAll } from './addCounts.ts'
import { readBasis, type ReadBasis } from './readBasis.ts'
import { readPositive } from './readPositive.ts'
import { readWater, type ReadWater } from './readWater.ts'
import type { SheetFinding, SheetInput } from './sheetTypes.ts'

/** A sheet's input with every figure exact; null where it is missing or cannot be read. */
export interface ReadSheet {
  lineAreasM2: ExactDecimal[]
  /** Null unless every line has an area. */
  areaM2: ExactDecimal | null
  /** Each count over all lines; null unless every line has it. */
  counts: Record<Each, ExactDecimal | null>
  water: ReadWater | null
  isDry: boolean
  tankL: ExactDecimal | null
  flowLPerMin: ExactDecimal | null
  bases: ReadBasis[]
  findings: SheetFinding[]
}

/** Reads a half-typed sheet; what is missing or not allowed becomes a finding, nothing throws. */
export function readSheet(input: SheetInput): ReadSheet {
  const findings: SheetFinding[] = []
  const lineAreasM2 = input.lines.map((line, index) => readArea(line.areaM2, index, findings))
  const hasEveryArea = lineAreasM2.length > 0 && lineAreasM2.every((area) => area.gt(0))
  if (lineAreasM2.length === 0) findings.push({ code: 'sheet.no_area', params: {} })
  const water = readWater(input, findings)
  const bases = input.components.map(({ basis }, index) => readBasis(basis, `components.${index}`, findings))
  refuseRatiosWithoutWater(input, bases, findings)
  const tankL = readPositive(input.tankL)
  if (tankL === null && bases.some((basis) => basis.kind === 'perTank')) {
    findings.push({ code: 'sheet.tank_needed', params: {}, path: 'sprayerId' })
  }
  const counts = readCounts(input, askedFor(bases, water), findings)
  const areaM2 = hasEveryArea ? lineAreasM2.reduce((sum, area) => sum.plus(area)) : null
  return { lineAreasM2, areaM2, counts, water, isDry: input.isDry ?? false, tankL, flowLPerMin: readPositive(input.flowLPerMin ?? null), bases, findings }
}

/** 1 part to N parts of a water that is not there says nothing. */
function refuseRatiosWithoutWater({ isDry, water }: SheetInput, bases: ReadBasis[], findings: SheetFinding[]): void {
  if (!isDry && water?.sizedFrom !== 'none') return
  bases.forEach((basis, index) => {
    if (basis.kind !== 'ratio' || basis.reading === 'in') return
    bases[index] = { kind: 'unknown', isLiquid: true }
    findings.push({ code: 'sheet.ratio_needs_water', params: {}, path: `components.${index}` })
  })
}

function readArea(areaM2: number, index: number, findings: SheetFinding[]): ExactDecimal {
  if (Number.isFinite(areaM2) && areaM2 > 0) return new ExactDecimal(areaM2)
  findings.push({ code: 'sheet.no_area', params: {}, path: `lines.${index}` })
  return new ExactDecimal(0)
}

/** The counts that something is sized by. */
function askedFor(bases: readonly ReadBasis[], water: ReadWater | null): Set<Each> {
  const asked = bases.flatMap((basis) => (basis.kind === 'perEach' ? [basis.each] : []))
  return new Set(water?.sizedFrom === 'perEach' ? [...asked, water.each] : asked)
}

function readCounts({ lines }: SheetInput, asked: Set<Each>, findings: SheetFinding[]): ReadSheet['counts'] {
  const sums: ReadSheet['counts'] = { plant: null, tree: null, rowM: null, bed: null, pot: null }
  for (const each of EACH) {
    const counted = countsOf(lines, each)
    sums[each] = sumAll(counted)
    if (!asked.has(each)) continue
    counted.forEach((count, index) => {
      if (count === null) findings.push({ code: 'sheet.count_needed', params: { each }, path: `lines.${index}.counts` })
    })
  }
  return sums
}
