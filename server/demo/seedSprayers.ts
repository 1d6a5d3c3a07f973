import { v7 as uuidV7 } from 'uuid'
import type { z } from 'zod'
import { createCalibrationSchema, type fittingSchema, type Measured } from '../../shared/contract/calibration.ts'
import { createSprayerSchema } from '../../shared/contract/farm.ts'
import { addDays } from '../../shared/time/calendar.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { farmToday } from '../services/blocks/drawingDay.ts'
import { createCalibration } from '../services/farms/calibrations.ts'
import { createSprayer } from '../services/farms/sprayers.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000

interface DemoSprayer {
  code: string
  name: string
  tankL: string
  flowLPerMin: string | null
  fitting: z.input<typeof fittingSchema>
  calibrated: { daysAgo: number; doneBy: string; measured: Measured; note: string | null }
}

/** The mister was measured this spring, with one tip nearly worn out; the drencher's is overdue, the knapsack's soon due. */
const DEMO_SPRAYERS: DemoSprayer[] = [
  {
    code: 'M2', name: 'Mist sprayer', tankL: '400', flowLPerMin: '12.2',
    fitting: { kind: 'airblast', swathM: '3', nozzle: { kind: 'iso', size: '02' }, nozzles: 12, screenMesh: 50, pressureBar: '5', speedKmH: '6' },
    calibrated: {
      daysAgo: 30, doneBy: 'Tam Lisk', note: 'Tip 12 goes first when the new set comes.',
      measured: {
        kind: 'catch', seconds: '60', nozzles: 12, swathM: '3', speedKmH: '6',
        catchesMl: ['1005', '1010', '1012', '1008', '1015', '1020', '1018', '1009', '1011', '1006', '1013', '1128'],
      },
    },
  },
  {
    code: 'D1', name: 'Drencher', tankL: '400', flowLPerMin: '24',
    fitting: { kind: 'drench', nozzle: { kind: 'other', name: 'Open lance, 12 mm', flowLPerMin: null } },
    calibrated: { daysAgo: 403, doneBy: 'Ruan Teal', note: null, measured: { kind: 'plot', volumeL: '48', areaM2: '30' } },
  },
  {
    code: 'K1', name: 'Knapsack', tankL: '15', flowLPerMin: null,
    fitting: { kind: 'knapsack', swathM: '0.8', nozzle: { kind: 'iso', size: '03' }, nozzles: 1, screenMesh: 80, pressureBar: '2', speedKmH: '3.5' },
    calibrated: { daysAgo: 354, doneBy: 'Oda Verrill', note: null, measured: { kind: 'course', widthIn: '31.5', ounces: '24' } },
  },
]

/** @returns ids by code. */
export async function seedSprayers(services: Services, actor: FarmActor): Promise<Map<string, string>> {
  const ids = new Map<string, string>()
  for (const { calibrated: _measured, ...fields } of DEMO_SPRAYERS) {
    const { sprayer } = await createSprayer(services, actor, createSprayerSchema.parse({ id: uuidV7(), ...fields }))
    ids.set(fields.code, sprayer.id)
  }
  return ids
}

/** What was measured on them, each on its own day. */
export async function seedCalibrations(services: Services, actor: FarmActor, ids: Map<string, string>): Promise<void> {
  const today = farmToday(services, actor)
  for (const { code, calibrated: { daysAgo, ...done } } of DEMO_SPRAYERS) {
    const then = { ...services, clock: fixedClock(new Date(services.clock.now().getTime() - daysAgo * DAY_MS).toISOString()) }
    await createCalibration(then, actor, createCalibrationSchema.parse({ id: uuidV7(), sprayerId: ids.get(code), on: addDays(today, -daysAgo), ...done }))
  }
}
