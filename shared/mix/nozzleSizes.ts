/** Size codes of hydraulic spray nozzles. */
export const NOZZLE_SIZES = ['01', '015', '02', '025', '03', '04', '05', '06', '08', '10'] as const
export type NozzleSize = (typeof NOZZLE_SIZES)[number]

/** Words of the colours; their names stand in the messages. */
export const NOZZLE_COLOURS = ['orange', 'green', 'yellow', 'lilac', 'blue', 'red', 'brown', 'grey', 'white', 'lightBlue'] as const
export type NozzleColour = (typeof NOZZLE_COLOURS)[number]

/** Pressure at which the nominal flow is given, bar. */
export const NOMINAL_BAR = '3'

/**
 * Nominal flow of one nozzle at 3 bar, litres a minute as decimal text, and its colour.
 * @source ISO 10625: colour coding of hydraulic spray nozzles by their flow; 0.4 L/min for each tenth of the code.
 */
export const NOZZLES: Record<NozzleSize, { flowLPerMin: string; colour: NozzleColour }> = {
  '01': { flowLPerMin: '0.4', colour: 'orange' },
  '015': { flowLPerMin: '0.6', colour: 'green' },
  '02': { flowLPerMin: '0.8', colour: 'yellow' },
  '025': { flowLPerMin: '1', colour: 'lilac' },
  '03': { flowLPerMin: '1.2', colour: 'blue' },
  '04': { flowLPerMin: '1.6', colour: 'red' },
  '05': { flowLPerMin: '2', colour: 'brown' },
  '06': { flowLPerMin: '2.4', colour: 'grey' },
  '08': { flowLPerMin: '3.2', colour: 'white' },
  '10': { flowLPerMin: '4', colour: 'lightBlue' },
}
