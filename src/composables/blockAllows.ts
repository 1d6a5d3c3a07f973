import type { Check } from '../../shared/contract/record.ts'

/**
 * What is known of a block as a whole today. Nothing of it is kept yet, and each line says so:
 * a rule that is not known is not a rule that passed.
 */
export function blockAllows(code: string): Check[] {
  const unknown = (name: string, rests: Check['rests'], about: string | null = null): Check => ({
    code: `blocks.${name}`,
    verdict: 'unknown',
    rests,
    title: { id: `blocks.allows.${name}.title`, params: {} },
    text: { id: `blocks.allows.${name}.text`, params: { code } },
    figure: null,
    source: null,
    band: null,
    about,
  })
  return [
    unknown('nearby', 'law', 'area'),
    unknown('holds', 'label'),
    unknown('status', 'certifier'),
    unknown('again', 'house'),
  ]
}
