import type { Check } from '../contract/record.ts'
import { asUsed } from './asUsed.ts'
import { buildCheck, words } from './buildCheck.ts'
import { dayOfUse } from './dayOfUse.ts'
import { judgeCalibration } from './judgeCalibration.ts'
import { judgeCounts } from './judgeCounts.ts'
import { judgeDeltaT } from './judgeDeltaT.ts'
import { judgePreHarvest, judgeReEntry } from './judgeHolds.ts'
import { judgeLabelRate } from './judgeLabelRate.ts'
import { judgeLabelStrength } from './judgeLabelStrength.ts'
import { judgeLotLeft } from './judgeLotLeft.ts'
import { judgeLotThere } from './judgeLotThere.ts'
import { judgeLotUse } from './judgeLotUse.ts'
import { judgeStatus } from './judgeStatus.ts'
import { judgeWind } from './judgeWind.ts'
import type { FactMaterial, RecordFacts } from './recordFacts.ts'
import { sortChecks } from './sortChecks.ts'
import { unevenShare } from './unevenShare.ts'

/** No rule set is kept yet, so nothing of the law was looked at; that is said, not passed over. */
const lawNotKnown = (): Check =>
  buildCheck({ code: 'law.rules', verdict: 'unknown', rests: 'law', title: words('checks.law.title'), text: words('checks.law.none') })

function checksOfComponent(facts: RecordFacts, usedOn: string, index: number): (Check | null)[] {
  const written = facts.content.components[index]
  const planned = facts.sheet.components[index]
  const material = facts.materials.find((one) => one.id === written?.materialId)
  if (!written || !planned || !material) return []
  const sheet = asUsed(planned, written.used)
  const most = unevenShare(facts, sheet !== planned)
  const code = facts.blocks.find(({ id }) => id === most.blockId)?.code ?? null
  const about = `component:${index}`
  const lot = facts.lots.find((one) => one.id === written.lotId)
  return [
    judgeLabelRate(material, sheet, { share: most.share, code }, about),
    judgeLabelStrength(material, sheet, facts.sheet, about),
    judgeStatus(material, about),
    lot ? judgeLotThere(usedOn, lot, material, about) : null,
    lot
      ? judgeLotUse(usedOn, lot, material, about)
      : buildCheck({
          code: 'lot.none', verdict: 'unknown', rests: 'house', about,
          title: words('checks.lotNone.title', { material: material.name }), text: words('checks.lotNone.text'),
        }),
  ]
}

/** One check a lot, however many components draw on it; by what was really taken, where that was written. */
function checksOfLots({ content, sheet, lots }: RecordFacts): Check[] {
  return lots.flatMap((lot) => {
    const first = content.components.findIndex((component) => component.lotId === lot.id)
    if (first < 0) return []
    const drawing = sheet.components.flatMap((component, index) => {
      const written = content.components[index]
      return written?.lotId === lot.id ? [asUsed(component, written.used)] : []
    })
    return [judgeLotLeft(lot, drawing, `component:${first}`)]
  })
}

/**
 * Every check of a record, as it is being written and again when it is signed, worst first within what each rests on. Pure: the
 * moment of the judgement is `facts.now`. A half-written record gives "not known" where a figure is missing, never a pass.
 * @param likely `judgeLikely`, apart because a form does without it, and its words, until there is something to ask about.
 */
export function recordChecks(facts: RecordFacts, likely: (facts: RecordFacts) => Check[] = () => []): Check[] {
  const materials = facts.content.components
    .map(({ materialId }) => facts.materials.find((one) => one.id === materialId))
    .filter((one): one is FactMaterial => one !== undefined)
  const usedOn = dayOfUse(facts)
  const found = [
    lawNotKnown(),
    ...facts.content.components.flatMap((_, index) => checksOfComponent(facts, usedOn, index)),
    judgeReEntry(facts, materials),
    judgePreHarvest(facts, materials),
    judgeWind(facts.content),
    judgeDeltaT(facts.content),
    judgeCalibration(facts, usedOn),
    ...judgeCounts(facts),
    ...likely(facts),
    ...checksOfLots(facts),
  ]
  return sortChecks(found.filter((check) => check !== null))
}
