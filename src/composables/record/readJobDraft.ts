import { rankLots } from '../../../shared/checks/rankLots.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { roundApi } from '../../api/roundApi.ts'
import { now } from '../../plugins/clock.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'
import { draftOfJobs } from './recordOfJobs.ts'
import type { RecordDraft } from './recordDraft.ts'
import type { RecordStock } from './useRecordStock.ts'

/** A form filled in from jobs, by the plans as the server or this device has them, with the lot that fits best and the only sprayer; null where no plan has the jobs. */
export async function readJobDraft({ farmId, farm, blocks, lots, sprayers }: RecordStock, jobIds: readonly string[]): Promise<RecordDraft | null> {
  const plans = await readThrough(`${farmId}/season-plans`, useSession().user?.id ?? '', () => roundApi.plans(farmId))
  const filled = draftOfJobs(jobIds, plans, new Set(blocks.map(({ id }) => id)), usePreferences().units)
  if (filled === null) return null
  const usedOn = civilDateIn(farm?.zone ?? 'UTC', now().toISOString())
  const [only, ...others] = sprayers
  return {
    ...filled,
    components: filled.components.map((component) => {
      const [best] = rankLots(lots.filter(({ materialId }) => materialId === component.materialId), { need: null, usedOn })
      return { ...component, lotId: best?.fitness === 'fit' ? best.lot.id : '' }
    }),
    sprayerId: filled.method !== 'solid' && only !== undefined && others.length === 0 ? only.id : '',
  }
}
