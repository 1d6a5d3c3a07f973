import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Boundary } from '../../../shared/contract/block.ts'
import type { Message } from '../../../shared/contract/common.ts'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { sumOnLand } from '../../../shared/records/sumOnLand.ts'
import { PLAIN_FIELDS, type PlainName } from '../../../shared/records/plainFields.ts'
import { basisWords, countsWords, knownWords, momentWords, partWords, waterWords } from '../../../shared/records/versionWords.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { convertQuantity, type Quantity } from '../../../shared/units/convertQuantity.ts'
import { readingAmountUnit } from '../../../shared/units/readingUnit.ts'
import { subtractDecimals } from '../../../shared/units/subtractDecimals.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import type { ReadFact } from './readFact.ts'
import type { RecordGround } from './recordGround.ts'
import { useFigures } from '../app/useFigures.ts'
import { useMessages } from '../app/useMessages.ts'
import { useReadWeather } from './useReadWeather.ts'

export interface ReadRow {
  name: string
  lot: string
  measure: string
  inAll: string
  /** What was really taken, and by how much it was another amount; empty where it was what the sheet says. */
  used: string
}

/** One block of a record. */
export interface ReadLine {
  code: string
  name: string
  geometry: Boundary | null
  part: string
  area: string
  counts: string
  stage: string
  when: string
  amount: string
  keepOut: string
  pickFrom: string
}

/** A plain field of the record: its label and its words, or what is said where none were written. */
export interface ReadWords {
  name: PlainName
  label: string
  words: string
  isLong: boolean
  isGiven: boolean
}

/** A record as a reader finds it: lines of text in the person's language and the farm's time; what is missing says so. */
export interface RecordReading {
  lines: ReadLine[]
  rows: ReadRow[]
  /** Null for a solid, which is spread dry. */
  water: { measure: string; inAll: string } | null
  total: string
  /** What went on all the lines together; empty for one line, or where one says nothing. */
  onLand: string
  over: string
  loads: string
  plain: ReadWords[]
  times: ReadFact[]
  people: ReadFact[]
  weather: ReadFact[]
}

/** The texts of one record's page. */
export function useRecordReading(record: Ref<ApplicationRecord | null>, ground: Ref<RecordGround>): ComputedRef<RecordReading | null> {
  const { t } = useI18n()
  const figures = useFigures()
  const { render } = useMessages()
  const weatherOf = useReadWeather()
  const said = (messages: readonly Message[]): string => messages.map(render).join(', ')
  const unknown = (text: string): string => text || t('recordRead.unknown')
  const zone = computed(() => ground.value.zone)
  const time = (instant: string): string => civilTimeIn(zone.value, instant)
  const day = (instant: string): string => figures.day(civilDateIn(zone.value, instant))
  const when = (instant: string | null): string => (instant === null ? '' : `${day(instant)}, ${time(instant)}`)

  /** A span of the farm's clock; the day is named again where it ends on another. @param isSaid its day stands beside it already. */
  function span(startedAt: string | null, endedAt: string | null, isSaid = false): string {
    if (startedAt === null) return ''
    if (isSaid && endedAt !== null) return `${time(startedAt)} – ${time(endedAt)}`
    if (endedAt === null) return when(startedAt)
    return `${when(startedAt)} – ${day(startedAt) === day(endedAt) ? time(endedAt) : when(endedAt)}`
  }

  function linesOf({ lines, computed: sums }: ApplicationRecord): ReadLine[] {
    const days = new Set(lines.flatMap(({ startedAt, endedAt }) => [startedAt, endedAt]).filter((at) => at !== null).map(day))
    return lines.map((line, index) => {
      const block = ground.value.blocks.find(({ id }) => id === line.blockId)
      const share = sums.lines[index]
      return {
        code: block?.code ?? '', name: block?.name ?? '', geometry: block?.geometry ?? null,
        part: said(partWords(line.part)),
        area: figures.area(share?.areaM2 ?? (line.part.kind === 'whole' ? (block?.areaM2 ?? null) : null)),
        counts: said(countsWords(line.counts)),
        stage: [line.stage ?? '', line.bbch === null ? '' : `BBCH ${line.bbch}`].filter((words) => words !== '').join(', '),
        when: unknown(span(line.startedAt, line.endedAt, lines.length > 1 && days.size === 1)),
        amount: line.amount === null ? t('recordRead.unknown') : `${line.amount.known === 'workedOut' ? worked(line.amount) : asTyped(line.amount)}, ${t(`records.known.${line.amount.known}`)}`,
        keepOut: said(momentWords(share?.reEntryUntil ?? null, zone.value)),
        pickFrom: share?.pickFrom ? figures.day(share.pickFrom) : '',
      }
    })
  }

  function rowsOf({ components, computed: sums }: ApplicationRecord): ReadRow[] {
    return components.map(({ materialId, lotId, basis, used }, index) => {
      const amount = sums.components[index]?.amount ?? null
      const lot = ground.value.lots.find(({ id }) => id === lotId)
      return {
        name: unknown(ground.value.materials.find(({ id }) => id === materialId)?.name ?? ''),
        lot: lot ? t('records.mix.lot', { code: lot.code }) : t('records.lots.none'),
        measure: said(basisWords(basis)),
        inAll: amount ? worked(amount) : '',
        used: used === null ? '' : `${said(knownWords(used))}${amount ? differenceOf(used, amount) : ''}`,
      }
    })
  }

  const asTyped = ({ value, unit }: Quantity): string => `${figures.amount(value)} ${figures.unit(unit)}`

  /** An amount that was worked out, in the unit it is read in. */
  function worked(amount: Quantity): string {
    const readIn = readingAmountUnit(amount, figures.reader.value.units)
    return `${figures.amount(convertQuantity(amount, readIn))} ${figures.unit(readIn)}`
  }

  function differenceOf(used: Quantity, planned: Quantity): string {
    const more = subtractDecimals(convertQuantity(used, planned.unit), planned.value)
    return Number(more) === 0 ? '' : ` (${more.startsWith('-') ? '' : '+'}${figures.plain(more, planned.unit)} ${figures.unitOf(planned.unit)})`
  }

  function waterOf(one: ApplicationRecord): RecordReading['water'] {
    if (one.method === 'solid') return null
    const name = (id: string): string => ground.value.materials.find((material) => material.id === id)?.name ?? ''
    return { measure: unknown(said(waterWords(one.water, one, name))), inAll: figures.volume(one.computed.waterL) }
  }

  function totalOf({ totalL, totalKg }: ApplicationRecord['computed']): string {
    return [figures.volume(totalL), figures.mass(totalKg)].filter((words) => words !== '').join(', ')
  }

  function overOf({ sprayLPerHa, kgPerHa, sprayPerEach, areaM2 }: ApplicationRecord['computed']): string {
    const rate = (value: number, unit: UnitCode): string => t('versions.read.over', { rate: figures.rate(value, unit), unit: figures.unitOf(unit), area: figures.area(areaM2), areaUnit: figures.unitOf('ha') })
    if (sprayPerEach) return t(`versions.forEach.${sprayPerEach.each}`, { value: figures.rate(sprayPerEach.litres, 'L'), unit: figures.unitOf('L') })
    return sprayLPerHa !== null ? rate(sprayLPerHa, 'L/ha') : kgPerHa !== null ? rate(kgPerHa, 'kg/ha') : ''
  }

  function loadsOf({ loads }: ApplicationRecord['computed']): string {
    if (loads === null) return ''
    const last = figures.volume(loads.lastL)
    const minutes = loads.fullMinutes === null ? '' : `, ${t('versions.read.minutes', { minutes: figures.plain(Math.round(loads.fullMinutes)) })}`
    if (loads.full === 0) return t('records.sprayer.loadsPart', { last })
    return `${t(loads.lastL > 0 ? 'records.sprayer.loadsFullAndPart' : 'records.sprayer.loadsFull', { count: loads.full, last }, loads.full)}${minutes}`
  }

  /** Said where it is more than a message takes to travel. */
  function skewOf(minutes: number | null): { note?: string } {
    if (minutes === null || minutes === 0) return {}
    const apart = figures.plain(Math.abs(minutes))
    return { note: t(minutes > 0 ? 'recordRead.clockAhead' : 'recordRead.clockBehind', { minutes: apart }, Math.abs(minutes)) }
  }

  function timesOf({ lines, deviceAt, receivedAt, signedAt, workedInOn, clockSkewMinutes }: ApplicationRecord): ReadFact[] {
    const starts = lines.flatMap(({ startedAt }) => startedAt ?? []).sort((a, b) => Date.parse(a) - Date.parse(b))
    const ends = lines.flatMap(({ endedAt }) => endedAt ?? []).sort((a, b) => Date.parse(a) - Date.parse(b))
    return [
      { name: t('recordRead.worked'), value: unknown(span(starts[0] ?? null, ends.at(-1) ?? null)), note: t('recordRead.zone', { zone: zone.value }) },
      ...(workedInOn === null ? [] : [{ name: t('versions.label.workedInOn'), value: figures.day(workedInOn) }]),
      { name: t('recordRead.device'), value: unknown(when(deviceAt)), ...skewOf(clockSkewMinutes) },
      { name: t('recordRead.server'), value: when(receivedAt) },
      { name: t('recordRead.signed'), value: unknown(when(signedAt)) },
    ]
  }

  function peopleOf({ doneBy, enteredBy, signedBy, signedWith, protection }: ApplicationRecord): ReadFact[] {
    return [
      { name: t('records.happened.doneBy'), value: unknown(doneBy?.name ?? '') },
      { name: t('records.happened.enteredBy'), value: unknown(enteredBy?.name ?? '') },
      { name: t('recordRead.signed'), value: unknown(signedBy !== null && signedWith === 'pin' ? t('people.signedByPin', { name: signedBy.name }) : signedBy?.name ?? '') },
      { name: t('versions.label.protection'), value: unknown(protection.map((piece) => t(`records.protection.${piece}`)).join(', ')) },
    ]
  }

  return computed(() => {
    const one = record.value
    if (one === null) return null
    const onLand = one.lines.length > 1 ? sumOnLand(one.lines) : null
    return {
      lines: linesOf(one), rows: rowsOf(one), water: waterOf(one),
      total: totalOf(one.computed), onLand: onLand === null ? '' : worked(onLand), over: overOf(one.computed), loads: loadsOf(one.computed),
      plain: PLAIN_FIELDS.map(({ name, isLong }) => ({
        name, isLong, label: t(`records.plain.${name}.label`), words: one[name] ?? t(`records.plain.${name}.none`), isGiven: one[name] !== null,
      })),
      times: timesOf(one), people: peopleOf(one), weather: weatherOf(one),
    }
  })
}
