/** Orders codes of blocks, lots and the like as a farm counts them: V2 before V10. */
export const compareCodes = (one: string, other: string): number => one.localeCompare(other, 'en', { numeric: true })
