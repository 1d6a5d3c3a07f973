/** Orders things by the code of their block as a farm counts them: V2 before V10. */
export const byBlock = (one: { blockCode: string }, other: { blockCode: string }): number => one.blockCode.localeCompare(other.blockCode, 'en', { numeric: true })
