/** Words of what ends or falls due. */
export const due = {
  title: 'Due and ending',
  review: '{count} signed record to review | {count} signed records to review',
  readThem: 'Read them',
  kinds: { certificate: 'Certificate', calibration: 'Calibration of', uncalibrated: 'Sprayer', training: 'Training of', licence: 'Licence of' },
  isDue: 'due {day}', wasDue: 'was due {day}', ends: 'ends {day}', ended: 'ended {day}', never: 'not calibrated yet',
}
