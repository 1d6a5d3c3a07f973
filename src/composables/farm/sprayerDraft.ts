import type { Fitting } from '../../../shared/contract/calibration.ts'
import type { Sprayer } from '../../../shared/contract/farm.ts'
import type { NozzleSize } from '../../../shared/mix/nozzleSizes.ts'
import { typedCount, typedFigure } from '../form/typedFigure.ts'

/** A sprayer's form as it is typed. */
export interface SprayerDraft {
  code: string
  name: string
  tankL: string
  flowLPerMin: string
  kind: Fitting['kind']
  swathM: string
  nozzleIs: 'none' | 'iso' | 'other'
  size: NozzleSize | null
  nozzleName: string
  nozzleFlow: string
  nozzles: string
  screenMesh: string
  pressureBar: string
  speedKmH: string
}

export function draftOfSprayer({ code, name, tankL, flowLPerMin, fitting }: Sprayer): SprayerDraft {
  const { nozzle } = fitting
  return {
    code, name, tankL, flowLPerMin: flowLPerMin ?? '', kind: fitting.kind, swathM: fitting.swathM ?? '',
    nozzleIs: nozzle?.kind ?? 'none', size: nozzle?.kind === 'iso' ? nozzle.size : null,
    nozzleName: nozzle?.kind === 'other' ? nozzle.name : '', nozzleFlow: nozzle?.kind === 'other' ? (nozzle.flowLPerMin ?? '') : '',
    nozzles: String(fitting.nozzles ?? ''), screenMesh: String(fitting.screenMesh ?? ''), pressureBar: fitting.pressureBar ?? '', speedKmH: fitting.speedKmH ?? '',
  }
}

/** The form as it is sent; the contract judges it. */
export function bodyOfSprayer(draft: SprayerDraft, revision: number): unknown {
  const nozzle = { none: null, iso: { kind: 'iso', size: draft.size }, other: { kind: 'other', name: draft.nozzleName, flowLPerMin: typedFigure(draft.nozzleFlow) } }
  return {
    revision, code: draft.code, name: draft.name, tankL: typedFigure(draft.tankL) ?? '', flowLPerMin: typedFigure(draft.flowLPerMin),
    fitting: {
      kind: draft.kind, swathM: typedFigure(draft.swathM), nozzle: nozzle[draft.nozzleIs], nozzles: typedCount(draft.nozzles),
      screenMesh: typedCount(draft.screenMesh), pressureBar: typedFigure(draft.pressureBar), speedKmH: typedFigure(draft.speedKmH),
    },
  }
}
