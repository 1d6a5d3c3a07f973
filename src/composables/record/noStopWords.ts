import type { Tally } from '../../../shared/checks/tallyChecks.ts'

type Say = (id: string, params?: Record<string, number | string>, plural?: number) => string

/** That no stop was found, and what was found besides. @param t vue-i18n's. */
export function noStopWords(t: Say, { caution, unknown }: Tally): string {
  const found = [
    ...(caution === 0 ? [] : [t('records.ready.cautions', { count: caution }, caution)]),
    ...(unknown === 0 ? [] : [t('records.ready.unknowns', { count: unknown })]),
  ]
  return found.length === 0 ? t('records.ready.noStop') : t('records.ready.noStopBut', { found: found.join('; ') })
}
