/** Words of the farm's journal. Every deed that the server writes down has its words under `action`: kind of thing, then what was done. */
export const journal = {
  title: 'Journal',
  intro: 'Who did what, when and from where. It is written by the deed itself and is never changed.',
  action: {
    farm: { created: 'Made the farm', factor_asked: 'Asked a second factor of who leads and certifies', factor_not_asked: 'Asked no second factor any more', updated: 'Changed the profile of the farm' },
    start: { updated: 'Passed a step of the first hour over, or put it away' },
    practice: { put_away: 'Put the practice farm away' },
    block: {
      created: 'Drew a block', updated: 'Changed a block', redrawn: 'Redrew a block', land_set: 'Set the land status of a block',
      ended_by_split: 'Split a block', ended_by_merge: 'Joined a block to others', ended_by_undone: 'Ended a block whose split or join was undone', reopened: 'Undid a split or a join',
    },
    planting: { created: 'Added a planting', updated: 'Changed a planting' },
    bed: { created: 'Added beds or rows', updated: 'Changed beds or rows' },
    event: { created: 'Wrote down an event', withdrawn: 'Took an event back' },
    site: { created: 'Added something to keep clear of', changed: 'Changed something to keep clear of' },
    ground: { created: 'Drew part of the ground plan', changed: 'Changed part of the ground plan' },
    material: { created: 'Added a material' },
    lot: { received: 'Received a lot', counted: 'Counted a lot' },
    sprayer: { created: 'Added a sprayer', updated: 'Changed a sprayer', retired: 'Put a sprayer out of use' },
    calibration: { created: 'Calibrated a sprayer', withdrawn: 'Took a calibration back' },
    record: {
      draft: 'Began a record', started: 'Started a record', updated: 'Changed an unsigned record', signed: 'Signed a record', amended: 'Amended a record',
      withdrawn: 'Withdrew a record', reviewed: 'Reviewed a record', discarded: 'Discarded an unsigned record',
    },
    file: { added: 'Added a photo or paper', removed: 'Took a photo or paper back' },
    person: {
      added: 'Took somebody in', renamed: 'Changed a person’s name', role_changed: 'Changed a person’s role', let_go: 'Let somebody go', taken_back: 'Took somebody in again',
      pin_set: 'Set a person’s PIN', sessions_ended: 'Ended a person’s sessions', factor_reset: 'Took a person’s second factor away',
    },
    phone: { enrolled: 'Made a phone the farm’s', revoked: 'Took a phone away from the farm' },
    grant: { given: 'Granted seasons to a certifier', changed: 'Changed a grant', ended: 'Ended a grant' },
    plan: { created: 'Made a season plan', updated: 'Changed a season plan', ended: 'Ended a season plan', reopened: 'Took the end of a season plan back' },
    job: { moved: 'Moved a job', skipped: 'Skipped a job', unskipped: 'Took the skip of a job back' },
    report: { downloaded: 'Downloaded a season report' },
  },
}
