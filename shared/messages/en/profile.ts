/** Words of the farm's profile and its form. */
export const profile = {
  edit: 'Change the profile', form: 'Profile of the farm', save: 'Keep changes', saved: 'The profile is kept.',
  seasonStartHint: 'Any day, month and day. It is fixed once a record is signed.',
  zoneChange: 'Records keep the times and days they have. Only what is written from now on follows the new zone.',
  zoneReason: 'Why the zone changes',
  units: 'Units', unitsOf: { metric: 'litres, hectares, kilometres an hour first', us: 'US gallons, acres, miles an hour first' }, unitsShort: { metric: 'Metric', us: 'US customary' },
  unitsHint: 'What its people read figures in until they choose for themselves, and which of two figures a calibration shows first. What was typed keeps its unit.',
  calibration: 'Calibrate sprayers every', days: 'days', daysOf: '{count} day | {count} days', calibrationHint: 'A common habit is once a season, and after nozzles are changed.',
  certificate: 'Organic certificate', certificateNone: 'none written down', certificateHas: 'The farm is certified', number: 'Number', body: 'Certifier', scope: 'Scope', scopeHint: 'In the words of the certificate.',
  issued: 'Issued', expires: 'Valid until', openEnd: 'no end printed',
  contact: 'Contact', contactNone: 'nobody written down', person: 'Whom to ask', address: 'Address', phone: 'Telephone', email: 'E-mail',
  rules: 'Rules it works under', rulesNone: 'none named', rulesHint: 'Named here and in reports. Records are not judged by them yet: what the law asks is not checked.',
  ruleWithSource: '{title} ({source})',
  ruleSet: {
    usOrganic: { title: 'US organic', source: 'National Organic Program, 7 CFR part 205' },
    usProduceSafety: { title: 'US produce safety', source: '21 CFR part 112' },
    usWorkerProtection: { title: 'US worker protection', source: 'Worker Protection Standard, 40 CFR part 170' },
    euOrganic: { title: 'EU organic', source: 'Regulation (EU) 2018/848' },
  },
  checks: {
    rules: { title: 'Rules', text: 'Named: {rules}. They are not judged yet, so what the law asks is not checked here.' },
    certificate: { title: 'Certificate', none: 'No certificate is written down.', ended: 'Ended on {day}.', soon: 'Ends on {day}, in {days} days.', open: 'No end is written down.', valid: 'Valid until {day}.' },
  },
}
