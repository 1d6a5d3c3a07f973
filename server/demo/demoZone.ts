/** The demo farm's land lies here. */
export const DEMO_ZONE = 'America/Los_Angeles'
