/** Questions about figures that can be, and are seldom meant. */
export const likely = {
  time: {
    title: 'Time on {code}',
    none: '{value}\u00A0{unit} went on in 0 min: start and end are the same. When did it end?',
    fast: '{value}\u00A0{unit} in {minutes} min. At {flow}\u00A0{flowUnit}/min it takes {need} min. Which figure is wrong?',
    long: '{hours} h without a break for {value}\u00A0{unit}. Is the day of the end right?',
  },
  applied: {
    title: 'On the land',
    text: '{applied} of {total}\u00A0{unit}: {rest}\u00A0{unit} are left over. Is an amount wrong?',
    over: '{applied} of {total}\u00A0{unit} mixed: more went on than there was. Is the unit right?',
  },
  used: {
    title: '{material}, taken',
    text: '{value}\u00A0{unit} beside {planned}\u00A0{unit} in the mix: {percent}\u00A0%. Is the unit right?',
  },
  reading: {
    wind: 'Wind as written',
    air: 'Air as written',
    text: '{value}\u00A0{unit} is outside {low} to {high}\u00A0{limitUnit}. Is the unit right?',
  },
}
