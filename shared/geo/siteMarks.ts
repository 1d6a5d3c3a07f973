import type { SiteKind } from '../contract/ground.ts'

/** The mark of each kind of site: one path to be stroked, in a square of 16. */
export const SITE_MARKS: Record<SiteKind, string> = {
  well: 'M8 2.5a5.5 5.5 0 1 0 0 11a5.5 5.5 0 1 0 0-11ZM8 7.2a.8.8 0 1 0 0 1.6a.8.8 0 1 0 0-1.6Z',
  spring: 'M8 2C9.5 5 12 6.9 12 9.6a4 4 0 0 1-8 0C4 6.9 6.5 5 8 2Z',
  watercourse: 'M1.5 6c2.2-2.6 4.3-2.6 6.5 0s4.3 2.6 6.5 0M1.5 10.5c2.2-2.6 4.3-2.6 6.5 0s4.3 2.6 6.5 0',
  pond: 'M1.8 8a6.2 4 0 1 0 12.4 0a6.2 4 0 1 0-12.4 0Z',
  hives: 'M3.5 3.5h9M2.5 7.5h11M3.5 11.5h9',
  dwelling: 'M2 8.2 8 3l6 5.2M4 7v6.5h8V7',
  school: 'M4 14.5V2l8.5 2.8L4 7.6',
  neighbourCrop: 'M8 14.5V6.5M8 9.5C4.8 9.5 3.5 7.4 3.5 4.4C6.6 4.4 8 6 8 9.5ZM8 12c3.2 0 4.5-2 4.5-4.8C9.4 7.2 8 8.6 8 12Z',
  other: 'M3 3h10v10H3Z',
}
