interface Window { earliestOn: string; latestOn: string; plannedOn: string }

/** How a job that is neither done nor skipped stands on a civil day: a day it was moved to outside its window widens it. */
export function openStateOn(today: string, { earliestOn, latestOn, plannedOn }: Window): 'planned' | 'due' | 'late' {
  if (today < (plannedOn < earliestOn ? plannedOn : earliestOn)) return 'planned'
  return today <= (plannedOn > latestOn ? plannedOn : latestOn) ? 'due' : 'late'
}
