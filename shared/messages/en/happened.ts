/** Words of what happened, on the second step of a record. */
export const happened = {
  changeMix: 'Change the mix',
  nextBlock: 'Next block',
}
