import type { Land } from '../../shared/contract/land.ts'
import type { Check } from '../../shared/contract/record.ts'
import type { Nearby } from './blockNearby.ts'

/**
 * What is known of a block as a whole today. What is not kept yet says so in its line:
 * a rule that is not known is not a rule that passed.
 */
export function blockAllows(code: string, land: Land | null, nearby: Nearby | null = null): Check[] {
  const line = (name: string, rests: Check['rests'], more: { about?: string; verdict?: Check['verdict']; text?: string; sites?: string } = {}): Check => ({
    code: `blocks.${name}`,
    verdict: more.verdict ?? 'unknown',
    rests,
    title: { id: `blocks.allows.${name}.title`, params: {} },
    text: { id: more.text ?? `blocks.allows.${name}.text`, params: { code, sites: more.sites ?? '' } },
    figure: null,
    source: null,
    band: null,
    about: more.about ?? null,
  })
  return [
    line('nearby', 'law', { about: 'area', ...nearby }),
    line('holds', 'label'),
    ...landLines(land).map((more) => line('status', 'certifier', more)),
    line('again', 'house'),
  ]
}

/** Land that is not certified asks for care with its harvest; a last prohibited substance that nobody wrote down is not known. */
function landLines(land: Land | null): { verdict?: Check['verdict']; text?: string }[] {
  if (land === null) return [{}]
  return [
    ...(land.status === 'certified' ? [] : [{ verdict: 'caution' as const, text: `blocks.allows.status.${land.status}` }]),
    ...(land.lastProhibited === null ? [{ text: 'blocks.allows.status.prohibited' }] : []),
  ]
}
