import type { Basis } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { ReportWords } from './reportWords.ts'

/** How an ingredient is measured out. */
export function measureWords(basis: Basis, words: ReportWords): string {
  const { say } = words
  switch (basis.kind) {
    case 'ratio':
      return say(basis.reading === 'in' ? 'mix.ratioIn' : 'mix.ratio', { parts: words.typed(basis.parts) })
    case 'perArea':
      return words.quantity(basis.value, basis.unit)
    case 'perEach':
      return say('mix.perEach', { amount: words.quantity(basis.value, basis.unit), each: say(`each.${basis.each}`) })
    case 'perTank':
      return say('mix.perTank', { amount: words.quantity(basis.value, basis.unit) })
    case 'total':
      return say('mix.inTotal', { amount: words.quantity(basis.value, basis.unit) })
  }
}

/** What stands beside the carrier water: the figure that was written for it. */
export function waterMeasure({ content: { water } }: SignedRecord, words: ReportWords): string {
  if (water === null || water.sizedFrom === 'none') return words.say('lines.none')
  const amount = words.quantity(water.value, water.unit)
  return water.sizedFrom === 'perEach' ? words.say('mix.perEach', { amount, each: words.say(`each.${water.each}`) }) : amount
}

/** What stands beside the head of the mix: what it was sized from and how its dilutions read. */
export function mixAside(signed: SignedRecord, words: ReportWords): string {
  const { say } = words
  const ratios = new Set(signed.content.components.flatMap(({ basis }) => (basis.kind === 'ratio' ? [basis.reading] : [])))
  return [
    sizedWords(signed, words),
    ...(ratios.has('to') ? [say('mix.ratioMeans')] : []),
    ...(ratios.has('in') ? [say('mix.ratioInMeans')] : []),
  ].filter((part) => part !== '').join('; ')
}

function sizedWords({ content, materials }: SignedRecord, words: ReportWords): string {
  const { say } = words
  const { water } = content
  if (water === null) return ''
  switch (water.sizedFrom) {
    case 'water':
      return say('mix.sizedWater')
    case 'sprayRate':
      return say('mix.sizedRate', { amount: words.quantity(water.value, water.unit) })
    case 'perEach':
      return say('mix.sizedEach', { amount: words.quantity(water.value, water.unit), each: say(`each.${water.each}`) })
    case 'jar': {
      const material = materials.find(({ id }) => id === content.components[water.component]?.materialId)
      return say('mix.sizedJar', { amount: words.quantity(water.value, water.unit), material: material?.name ?? say('lines.none') })
    }
    case 'none':
      return say('mix.sizedNone')
  }
}

/** The mix by its way of applying, its loads with their minutes, and how much each plant or bed got. */
export function mixName({ content: { method }, computed: { loads, sprayPerEach } }: SignedRecord, words: ReportWords, lastLoad: (lastL: string) => string): string {
  const { say } = words
  const name = say(`mix.name.${method}`)
  const each = sprayPerEach === null ? name : say('mix.nameEach', { name, amount: words.worked(sprayPerEach.litres, 'L'), each: say(`each.${sprayPerEach.each}`) })
  if (!loads) return each
  const minutes = (load: string, value: string | null): string => (value === null ? load : say('mix.load.minutes', { load, minutes: words.minutes(value) }))
  const full = loads.full === 0 ? [] : [minutes(say('mix.load.full', { count: loads.full, litres: words.tank(loads.tankL) }, loads.full), loads.fullMinutes)]
  const last = Number(loads.lastL) > 0 ? [minutes(say(loads.full === 0 ? 'mix.load.only' : 'mix.load.last', { litres: lastLoad(loads.lastL) }), loads.lastMinutes)] : []
  return say('mix.nameLoads', { name: each, loads: words.join([...full, ...last]) })
}
