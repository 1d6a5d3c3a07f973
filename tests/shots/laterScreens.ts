/** Pictures of the design whose screens are not in this form of the product, each with what it waits for. */
export const LATER_SCREENS: Record<string, string> = {
  'd-06-batch': 'batches',
  'k-01-components': 'a sheet of parts, not a screen',
  'k-02-elements': 'a sheet of parts, not a screen',
  'k-03-elements-dawn': 'a sheet of parts, not a screen',
  'm-03-reading': 'readings of a batch',
  'm-04-offline': 'a phone without signal through batches and rounds',
  'p-03-gate-notice': 'gate notices',
}
