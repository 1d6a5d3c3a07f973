import { words } from '../../../shared/checks/buildCheck.ts'
import type { Land } from '../../../shared/contract/land.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { Held } from '../../../shared/season/holdsNow.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import type { Nearby } from './blockNearby.ts'

/** What holds a block, on the farm's clock. */
export type BlockHeld = Held & { zone: string }

/**
 * What is known of a block as a whole today. What is not kept yet says so in its line:
 * a rule that is not known is not a rule that passed.
 * @param held what holds it now, null where nothing that is signed does; undefined until that is read.
 */
export function blockAllows(code: string, land: Land | null, nearby: Nearby | null = null, held: BlockHeld | null | undefined = undefined): Check[] {
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
    ...holdLines(code, held, line('holds', 'label')),
    ...landLines(land).map((more) => line('status', 'certifier', more)),
    line('again', 'house'),
  ]
}

/** A hold in two lines, for entry and for picking; where none is in force it stays not known, for a label that nobody wrote down sets one all the same. */
function holdLines(code: string, held: BlockHeld | null | undefined, bare: Check): Check[] {
  if (held === undefined) return [bare]
  if (held === null) return [{ ...bare, text: words('blocks.allows.holds.none', { code }) }]
  const { reEntryUntil, pickFrom, zone } = held
  const caution = { ...bare, verdict: 'caution' as const }
  return [
    ...(reEntryUntil === null ? [] : [{ ...caution, text: words('checks.reEntry.until', { blocks: code, untilTime: civilTimeIn(zone, reEntryUntil), untilOn: civilDateIn(zone, reEntryUntil) }) }]),
    ...(pickFrom === null ? [] : [{ ...caution, text: words('checks.preHarvest.before', { blocks: code, pickOn: pickFrom }) }]),
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
