/** Square metres in a hectare, exactly. */
export const M2_PER_HA = 10_000
