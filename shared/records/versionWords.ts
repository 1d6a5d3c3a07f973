import * as Instant from 'temporal-polyfill/fns/Instant'
import { words } from '../checks/buildCheck.ts'
import type { Message } from '../contract/common.ts'
import { EACH } from '../contract/each.ts'
import type { Basis, Counts, Part, RecordContent, Water } from '../contract/recordContent.ts'
import type { SignedRecord } from '../contract/signedRecord.ts'
import { canonicalText } from '../evidence/canonicalText.ts'
import { sha256Hex } from '../evidence/sha256Hex.ts'
import { measurePolygon } from '../geo/measurePolygon.ts'
import { civilDateIn, civilTimeIn } from '../time/civilDate.ts'
import { roundDecimal } from '../units/roundDecimal.ts'
import { M2_PER_HA } from '../units/hectare.ts'

const OUTLINE_DIGITS = 6

/** What somebody wrote, as it stands. */
export const plainWords = (text: string | null): Message[] => (text === null || text === '' ? [] : [words('versions.text', { text })])

/** Decimal text as a number where that says the same, so that it takes the reader's marks. */
export const shownDecimal = (text: string): string | number => (String(Number(text)) === text ? Number(text) : text)

export const amountWords = (amount: { value: string; unit: string } | null): Message[] =>
  (amount === null ? [] : [words('versions.amount', { value: shownDecimal(amount.value), unit: amount.unit })])

/** A figure that was worked out, to four decimals. */
export const figureWords = (value: string | null, unit: string): Message[] => (value === null ? [] : [words('versions.figure.workedOut', { value: shownDecimal(roundDecimal(value, 4)), unit })])

export const knownWords = (amount: { value: string; unit: string; known: 'measured' | 'counted' | 'workedOut' } | null): Message[] =>
  (amount === null ? [] : [...amountWords(amount), words(`records.known.${amount.known}`)])

/** An instant on the farm's clock, seconds only where there are some. */
export function momentWords(instant: string | null, zone: string): Message[] {
  if (instant === null) return []
  // Written out in UTC, the seconds stand between the second colon and the Z, with no zeros at the end of their parts.
  const [, , last = ''] = Instant.toString(Instant.fromString(instant)).replace('Z', '').split(':')
  const seconds = /^0*$/.test(last) ? '' : `:${last}`
  return [words('versions.moment', { dayOn: civilDateIn(zone, instant), time: `${civilTimeIn(zone, instant)}${seconds}` })]
}

/** A drawn part is told apart by its area, its corners, and the first digits of its outline's digest. */
export function partWords(part: Part): Message[] {
  switch (part.kind) {
    case 'whole': return [words('versions.part.whole')]
    case 'fraction': return [words('versions.part.fraction', { fraction: shownDecimal(part.fraction) })]
    case 'drawn': {
      const hectares = Number(roundDecimal(String(measurePolygon(part.geometry).areaM2 / M2_PER_HA), 4))
      return [words('versions.part.drawn', { hectares, outline: sha256Hex(canonicalText(part.geometry)).slice(0, OUTLINE_DIGITS) })]
    }
    default: return [words(`versions.part.${part.kind}`, { from: part.from, to: part.to, of: part.of })]
  }
}

export const countsWords = (counts: Counts): Message[] =>
  EACH.flatMap((each) => { const count = counts[each]; return count === undefined ? [] : [words(`versions.count.${each}`, { count: shownDecimal(count) })] })

export function basisWords(basis: Basis): Message[] {
  if (basis.kind === 'ratio') return [words(`versions.ratio.${basis.reading}`, { parts: shownDecimal(basis.parts) })]
  const amount = { value: shownDecimal(basis.value), unit: basis.unit }
  return [basis.kind === 'perEach' ? words(`versions.forEach.${basis.each}`, amount) : words(`versions.basis.${basis.kind}`, amount)]
}

export function waterWords(water: Water | null, { components }: Pick<RecordContent, 'components'>, names: (materialId: string) => string): Message[] {
  if (water === null) return []
  if (water.sizedFrom === 'none') return [words('records.mix.none')]
  const [amount, source] = [{ value: shownDecimal(water.value), unit: water.unit }, plainWords(water.source)]
  if (water.sizedFrom === 'perEach') return [words(`versions.forEach.${water.each}`, amount), ...source]
  if (water.sizedFrom === 'jar') {
    const name = names(components[water.component]?.materialId ?? '')
    return [words('versions.sized.jar', { ...amount, number: water.component + 1, name }), ...source]
  }
  return [words(`versions.sized.${water.sizedFrom}`, amount), ...source]
}

/** What stood under an id in the signed text itself; empty where nothing did. */
export function nameIn(signed: SignedRecord) {
  const find = <Thing extends { id: string }>(things: readonly Thing[], id: string | null) => things.find((thing) => thing.id === id)
  return {
    block: (id: string) => find(signed.blocks, id)?.code ?? '',
    material: (id: string) => find(signed.materials, id)?.name ?? '',
    lot: (id: string | null) => find(signed.lots, id)?.code ?? '',
  }
}
