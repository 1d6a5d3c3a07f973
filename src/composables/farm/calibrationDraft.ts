import type { Measured } from '../../../shared/contract/calibration.ts'
import type { Sprayer } from '../../../shared/contract/farm.ts'
import { typedCount, typedFigure, typedWords } from '../form/typedFigure.ts'

/** The form of a calibration as it is typed. */
export interface CalibrationDraft {
  kind: Measured['kind']
  on: string | null
  doneBy: string
  note: string
  seconds: string
  catches: string
  nozzles: string
  swathM: string
  speedKmH: string
  flow: string
  widthIn: string
  ounces: string
  volumeL: string
  areaM2: string
}

/** What is fitted is proposed; a knapsack begins with the plot it walks. */
export function newCalibration({ fitting, flowLPerMin }: Sprayer, today: string, doneBy: string): CalibrationDraft {
  return {
    kind: fitting.kind === 'boom' || fitting.kind === 'airblast' ? 'catch' : 'plot', on: today, doneBy, note: '', seconds: '60', catches: '',
    nozzles: String(fitting.nozzles ?? ''), swathM: fitting.swathM ?? '', speedKmH: fitting.speedKmH ?? '', flow: flowLPerMin ?? '', widthIn: '', ounces: '', volumeL: '', areaM2: '',
  }
}

/** What was measured, as it is sent; the contract judges it. */
export function measuredOf(draft: CalibrationDraft): unknown {
  const { kind, swathM, speedKmH } = draft
  const driven = { swathM: typedFigure(swathM) ?? '', speedKmH: typedFigure(speedKmH) ?? '' }
  switch (kind) {
    case 'catch':
      return { kind, ...driven, seconds: typedFigure(draft.seconds) ?? '', nozzles: typedCount(draft.nozzles), catchesMl: draft.catches.split(/[\s;]+/).filter((text) => text !== '').map((text) => typedFigure(text)) }
    case 'flow':
      return { kind, ...driven, flowLPerMin: typedFigure(draft.flow) ?? '' }
    case 'course':
      return { kind, widthIn: typedFigure(draft.widthIn) ?? '', ounces: typedFigure(draft.ounces) ?? '' }
    case 'plot':
      return { kind, volumeL: typedFigure(draft.volumeL) ?? '', areaM2: typedFigure(draft.areaM2) ?? '' }
  }
}

/** The whole form as it is sent. */
export function bodyOfCalibration(draft: CalibrationDraft, { id, sprayerId }: { id: string; sprayerId: string }): unknown {
  return { id, sprayerId, on: draft.on ?? '', doneBy: draft.doneBy, measured: measuredOf(draft), note: typedWords(draft.note) }
}
