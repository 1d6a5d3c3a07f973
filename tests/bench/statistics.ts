/** What one round took, in milliseconds or in what they were read as: ours, the baseline, and the baseline once more. */
export interface Round { ours: number; baseline: number; again: number }

export interface Summary {
  /** Median of each side. */
  ours: number
  baseline: number
  /** Median of the rounds' ratios of ours to the baseline, with its quartiles. */
  ratio: number
  q1: number
  q3: number
  n: number
  /** Median of the rounds' ratios of the baseline to itself: what the machine adds. */
  control: number
  noisy: boolean
}

/** The control may stray so far from 1 before a figure is called noisy. */
const CONTROL_BOUNDS = [0.95, 1.05] as const

/** The figures of some rounds. @throws {RangeError} for no round. */
export function summarise(rounds: readonly Round[]): Summary {
  const ratios = rounds.map(({ ours, baseline }) => ours / baseline)
  const control = quantile(rounds.map(({ baseline, again }) => again / baseline), 0.5)
  return {
    ours: quantile(rounds.map(({ ours }) => ours), 0.5),
    baseline: quantile(rounds.map(({ baseline }) => baseline), 0.5),
    ratio: quantile(ratios, 0.5),
    q1: quantile(ratios, 0.25),
    q3: quantile(ratios, 0.75),
    n: rounds.length,
    control,
    noisy: control < CONTROL_BOUNDS[0] || control > CONTROL_BOUNDS[1],
  }
}

/**
 * The value below which a share of the values lies, straight between neighbours.
 * @source Hyndman and Fan 1996, definition 7. @throws {RangeError} for no value.
 */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((one, other) => one - other)
  const place = (sorted.length - 1) * share
  const below = sorted[Math.floor(place)]
  const above = sorted[Math.ceil(place)]
  if (below === undefined || above === undefined) throw new RangeError('no values')
  return below + (above - below) * (place - Math.floor(place))
}
