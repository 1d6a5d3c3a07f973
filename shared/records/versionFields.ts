import * as Instant from 'temporal-polyfill/fns/Instant'
import { words } from '../checks/buildCheck.ts'
import type { Message } from '../contract/common.ts'
import type { SignedRecord } from '../contract/signedRecord.ts'
import { canonicalText } from '../evidence/canonicalText.ts'
import { PLAIN_FIELDS } from './plainFields.ts'
import { amountWords, basisWords, countsWords, figureWords, knownWords, momentWords, nameIn, partWords, plainWords, waterWords } from './versionWords.ts'

/** One thing that a version says. */
export interface VersionField {
  /** The same for the same thing in two versions, wherever its line stands. */
  key: string
  /** Where it stands in the signed text. */
  path: string
  /** What it is about, from the wide to the narrow. */
  label: Message[]
  words: Message[]
  /** The whole of it as one text: whatever differs, differs here. */
  value: string
}

type PersonName = (id: string) => string

const label = (name: FieldName): Message => words(`versions.label.${name}`)
type FieldName =
  | 'method' | 'blocks' | 'part' | 'counts' | 'stage' | 'bbch' | 'startedAt' | 'endedAt' | 'amount' | 'components' | 'lot' | 'basis' | 'used' | 'inAll'
  | 'water' | 'sprayer' | 'workedInOn' | 'wind' | 'windFrom' | 'air' | 'humidity' | 'protection' | 'doneBy' | 'area' | 'totalL' | 'totalKg'
  | 'keepOut' | 'pickFrom' | 'stops' | 'cautions' | 'unknowns' | 'said' | 'files'

const field = (path: string, name: FieldName, words: Message[], value: unknown, key = path): VersionField =>
  ({ key, path, label: [label(name)], words, value: canonicalText(value ?? null) })

/** The instant itself, however it was spelled. */
const instantOf = (text: string | null): string | null => (text === null ? null : Instant.toString(Instant.fromString(text)))

/** Everything that a version says, in the order of the page: what was written, then what follows from it. */
export function versionFields(signed: SignedRecord, personName: PersonName): VersionField[] {
  return [...lineFields(signed), ...componentFields(signed), ...wholeFields(signed, personName), ...figureFields(signed), ...judgedFields(signed)]
}

function lineFields(signed: SignedRecord): VersionField[] {
  const { content: { method, lines }, farm: { zone }, computed } = signed
  const name = nameIn(signed)
  const codes = lines.map(({ blockId }) => name.block(blockId))
  const head = [
    field('content.method', 'method', [words(`records.method.${method}Long`)], method),
    field('content.lines', 'blocks', plainWords(codes.join(', ')), lines.map(({ blockId }) => blockId)),
  ]
  return [...head, ...lines.flatMap((line, index) => {
    const path = `content.lines.${index}`
    const holds = computed.lines[index]
    const fields = [
      field(`${path}.part`, 'part', partWords(line.part), line.part),
      field(`${path}.counts`, 'counts', countsWords(line.counts), Object.keys(line.counts).length > 0 ? line.counts : null),
      field(`${path}.stage`, 'stage', plainWords(line.stage), line.stage),
      field(`${path}.bbch`, 'bbch', plainWords(line.bbch), line.bbch),
      field(`${path}.startedAt`, 'startedAt', momentWords(line.startedAt, zone), instantOf(line.startedAt)),
      field(`${path}.endedAt`, 'endedAt', momentWords(line.endedAt, zone), instantOf(line.endedAt)),
      field(`${path}.amount`, 'amount', knownWords(line.amount), line.amount),
      field(`computed.lines.${index}.reEntryUntil`, 'keepOut', momentWords(holds?.reEntryUntil ?? null, zone), instantOf(holds?.reEntryUntil ?? null)),
      field(`computed.lines.${index}.pickFrom`, 'pickFrom', dayWords(holds?.pickFrom ?? null), holds?.pickFrom),
    ]
    return within(fields, path, `line:${line.blockId}#${placeAmong(lines.map(({ blockId }) => blockId), index)}`, codes[index] ?? '')
  })]
}

function componentFields(signed: SignedRecord): VersionField[] {
  const { components } = signed.content
  const name = nameIn(signed)
  const names = components.map(({ materialId }) => name.material(materialId))
  const head = field('content.components', 'components', plainWords(names.join(', ')), components.map(({ materialId }) => materialId))
  return [head, ...components.flatMap((component, index) => {
    const path = `content.components.${index}`
    const amount = signed.computed.components[index]?.amount ?? null
    const fields = [
      field(`${path}.lotId`, 'lot', plainWords(name.lot(component.lotId)), component.lotId),
      field(`${path}.basis`, 'basis', basisWords(component.basis), component.basis),
      field(`${path}.used`, 'used', knownWords(component.used), component.used),
      field(`computed.components.${index}.amount`, 'inAll', amount === null ? [] : figureWords(amount.value, amount.unit), amount),
    ]
    return within(fields, path, `component:${component.materialId}#${placeAmong(components.map(({ materialId }) => materialId), index)}`, names[index] ?? '')
  })]
}

/** Fields of one line under the name of its block, or of its material. */
function within(fields: VersionField[], path: string, key: string, name: string): VersionField[] {
  return fields.map((one) => ({ ...one, key: `${key}.${one.path.slice(one.path.lastIndexOf('.') + 1)}`, label: [...plainWords(name), ...one.label] }))
    .map((one) => (one.path.startsWith(path) ? one : { ...one, key: `${one.key} computed` }))
}

/** The how-manieth of its kind it is: a block may stand in two lines. */
function placeAmong(ids: readonly string[], index: number): number {
  return ids.slice(0, index).filter((id) => id === ids[index]).length
}

function wholeFields(signed: SignedRecord, personName: PersonName): VersionField[] {
  const { content, sprayer } = signed
  const { weather } = content
  const reading = (name: 'wind' | 'air' | 'humidity') => {
    const value = weather?.[name] ?? null
    return field(`content.weather.${name}`, name, value === null ? [] : [...amountWords(value), words(`records.weather.kind.${value.kind}`)], value)
  }
  const from = weather?.windFrom ?? null
  return [
    field('content.water', 'water', waterWords(content.water, content, nameIn(signed).material), content.water),
    field('content.sprayerId', 'sprayer', plainWords(sprayer && `${sprayer.code} ${sprayer.name}`), content.sprayerId),
    field('content.workedInOn', 'workedInOn', dayWords(content.workedInOn), content.workedInOn),
    reading('wind'),
    field('content.weather.windFrom', 'windFrom', from === null ? [] : [words(`records.weather.compass.${from}`)], from),
    reading('air'),
    reading('humidity'),
    field('content.protection', 'protection', content.protection.map((piece) => words(`records.protection.${piece}`)), content.protection),
    ...PLAIN_FIELDS.map(({ name }): VersionField => ({
      key: `content.${name}`, path: `content.${name}`, label: [words(`records.plain.${name}.label`)], words: plainWords(content[name]), value: canonicalText(content[name]),
    })),
    field('content.doneById', 'doneBy', plainWords(personName(signed.people.doneBy.id)), content.doneById),
  ]
}

function figureFields({ computed, files }: SignedRecord): VersionField[] {
  return [
    field('computed.areaM2', 'area', figureWords(computed.areaM2, 'm2'), computed.areaM2),
    field('computed.totalL', 'totalL', figureWords(computed.totalL, 'L'), computed.totalL),
    field('computed.totalKg', 'totalKg', figureWords(computed.totalKg, 'kg'), computed.totalKg),
    field('files', 'files', plainWords(files.map((file) => file.label).join(', ')), files),
  ]
}

function judgedFields({ checks, acknowledged }: SignedRecord): VersionField[] {
  const of = (verdict: (typeof checks)[number]['verdict']) => checks.filter((check) => check.verdict === verdict).map(({ title }) => title)
  return [
    field('checks.stop', 'stops', of('stop'), of('stop')),
    field('checks.caution', 'cautions', of('caution'), of('caution')),
    field('checks.unknown', 'unknowns', of('unknown'), of('unknown')),
    ...acknowledged.map(({ code, reason }, index): VersionField => {
      const about = checks.find((check) => check.code === code)?.title
      return { key: `acknowledged:${code}`, path: `acknowledged.${index}`, label: [label('said'), ...(about ? [about] : [])], words: plainWords(reason), value: canonicalText(reason) }
    }),
  ]
}

function dayWords(date: string | null): Message[] {
  return date === null ? [] : [words('versions.day', { dayOn: date })]
}
