/** Who leads the farm's things: blocks, inputs, sprayers. */
export const LEADERS = ['owner', 'manager'] as const
/** The farm's own people. */
export const FARM_PEOPLE = ['owner', 'manager', 'applicator'] as const
/** Everybody who has the farm in their world. */
export const EVERY_ROLE = ['owner', 'manager', 'applicator', 'certifier'] as const
