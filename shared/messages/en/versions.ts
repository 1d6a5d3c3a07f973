/** Words of a signed record's versions: amending, withdrawing, reviewing, and what changed from one to the next. */
export const versions = {
  text: '{text}',
  amount: '{value} {unit}',
  moment: '{dayOn}, {time}',
  day: '{dayOn}',
  notSaid: 'not said',
  part: {
    whole: 'whole block',
    fraction: '{fraction} of the block',
    drawn: 'a part as drawn, {hectares} ha, outline {outline}',
    rows: 'rows {from} to {to} of {of}',
    beds: 'beds {from} to {to} of {of}',
  },
  count: { plant: '{count} plants', tree: '{count} trees', rowM: '{count} m of row', bed: '{count} beds', pot: '{count} pots' },
  forEach: { plant: 'for each plant', tree: 'for each tree', rowM: 'for each metre of row', bed: 'for each bed', pot: 'for each pot' },
  ratio: { to: '1 part to {parts} parts of water', in: '1 part in {parts} parts of the mix' },
  basis: { perTank: 'in each full tank', total: 'in all' },
  sized: { water: 'of carrier water', sprayRate: 'of the mix', perEach: 'of the mix', jar: 'of ingredient {number}, {name}' },
  label: {
    method: 'Method', blocks: 'Blocks', part: 'Part', counts: 'Counted', stage: 'Growth stage', bbch: 'BBCH', startedAt: 'Start', endedAt: 'End', amount: 'Amount',
    components: 'Ingredients', lot: 'Lot', basis: 'Measure', used: 'Used', inAll: 'In all', water: 'Sized from', sprayer: 'Sprayer', workedInOn: 'Worked in',
    wind: 'Wind', windFrom: 'Wind from', air: 'Air', humidity: 'Humidity', protection: 'Worn', doneBy: 'Done by', area: 'Ground treated', totalL: 'Mix in all',
    totalKg: 'Weighed in all', keepOut: 'Keep out until', pickFrom: 'Do not pick until', stops: 'Stops', cautions: 'Cautions', unknowns: 'Not known',
    said: 'Said of what was unlikely or stopped', files: 'Photos and papers',
  },
}
