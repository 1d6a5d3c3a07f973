/** Words of letters. `{untilOn}` and its like are civil days. */
export const mail = {
  greeting: 'Hello,',
  greetingTo: 'Hello {name},',
  foot: 'Sent by the register at {address}. It keeps records and does arithmetic; labels, local codes and licensed people decide.',
  noReply: 'Nobody reads answers to this letter.',
  grant: {
    subject: '{farm} opens its register to you: season {seasons}',
    text: '{by} lets you read the register of {farm} for {organisation}.',
    readOnly: 'You read and download; nothing you do there changes a record. What you take away is written into the journal of the farm.',
    farm: 'Farm', seasons: 'Seasons', endsOn: 'Open until', day: '{endsOn}',
    open: 'Open my farms', accept: 'Set a password and open it',
  },
  invitation: {
    subject: 'You are invited to {farm}',
    text: '{by} asks you to join {farm} in its register of foliar sprays and soil drenches.',
    owner: 'You would be an owner: everything on the farm, its people and their roles included.',
    manager: 'You would run the season: blocks, inputs, rounds, reviews and reports.',
    applicator: 'You would spray and brew: your records are done and signed by you.',
    certifier: 'You would read what the farm grants you, and change nothing.',
    action: 'Take the invitation',
    until: 'The link works once, until {untilOn}.',
    stranger: 'If you do not know this farm, leave the letter alone: nothing happens without you.',
  },
  jobsDue: {
    subject: '{farm}: due today, {dueCount}',
    subjectLate: '{farm}: late {lateCount}, due {dueCount}',
    text: 'On {farm}, {todayOn}, these jobs of the season plans wait:',
    late: 'Late: {preparation}',
    due: 'Due: {preparation}',
    action: 'Open the season sheet',
    why: 'You get this because you lead the farm. It comes once a day, and not at all when nothing is due.',
  },
}
