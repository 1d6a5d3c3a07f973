/** Words where two people changed one thing. */
export const merge = {
  title: 'Somebody changed this since you opened it. Nothing is lost.',
  taken: 'Taken over from them, since you had not touched it: {fields}.',
  clash: '{field} was changed by both. Choose one:',
  theirs: 'Theirs: {value}', mine: 'Yours: {value}', nothing: 'nothing', yes: 'yes', no: 'no', other: 'as it stands there',
  again: 'Look at it once more, then keep it.',
}
