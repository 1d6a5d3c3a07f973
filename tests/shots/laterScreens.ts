/** Pictures of the design whose screens are not in this form of the product, each with what it waits for. */
export const LATER_SCREENS: Record<string, string> = {
  'd-05-season-sheet': 'rounds and the season sheet',
  'd-06-batch': 'batches',
  'd-07-my-farms': 'trace, sample and queries of My farms; the first form of the place is d-my-farms',
  'k-01-components': 'a sheet of parts, not a screen',
  'k-02-elements': 'a sheet of parts, not a screen',
  'k-03-elements-dawn': 'a sheet of parts, not a screen',
  'm-03-reading': 'readings of a batch',
  'm-04-offline': 'a phone without signal through batches and rounds',
  'p-02-season-report': 'the season report',
  'p-03-gate-notice': 'gate notices',
}
