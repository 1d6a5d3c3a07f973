import type { GroundFeature, Site, SiteKind } from '../../../shared/contract/ground.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { storedFor, type Reader } from '../../../shared/messages/readFigure.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'

/** A row of the list, every word ready to read. */
export interface GroundLine {
  id: string
  name: string
  kind: string
  mark: SiteKind | null
  /** The distance or the width, or that there is none. */
  length: string
  isKnown: boolean
  note: string
  /** Since when it is there no more; empty while it is. */
  gone: string
}

/** Sites in words, those that are gone last. */
export function siteLines(reader: Reader, sites: readonly Site[]): GroundLine[] {
  const { language } = reader
  return goneLast(sites.map(({ id, kind, name, keepClearM, note, endedOn }) => ({
    id, name, kind: translate(language, `ground.siteKind.${kind}`), mark: kind, note: note ?? '',
    length: keepClearM === null ? translate(language, 'ground.list.noDistance') : storedFor(reader, keepClearM, 'm'),
    isKnown: keepClearM !== null, gone: goneWords(language, endedOn),
  })))
}

/** The ground plan in words, what is gone last. */
export function groundLines(reader: Reader, features: readonly GroundFeature[]): GroundLine[] {
  const { language } = reader
  return goneLast(features.map(({ id, kind, name, widthM, endedOn }) => ({
    id, name: name ?? '', kind: translate(language, `ground.groundKind.${kind}`), mark: null, note: '',
    length: widthM === null ? '' : storedFor(reader, widthM, 'm'), isKnown: widthM !== null, gone: goneWords(language, endedOn),
  })))
}

function goneWords(language: Language, endedOn: string | null): string {
  return endedOn === null ? '' : translate(language, 'ground.list.gone', { day: formatDay(language, endedOn) })
}

const goneLast = (lines: GroundLine[]): GroundLine[] => [...lines.filter(({ gone }) => gone === ''), ...lines.filter(({ gone }) => gone !== '')]
