/** Words of a draft that cannot be gone on with where it was opened. */
export const draftElsewhere = {
  notHere: {
    title: 'This draft is not on this device.',
    text: 'The farm has no record under this address either. A draft that was not sent stays on the phone or computer it was typed on, for whoever typed it; one that was discarded is gone.',
  },
  unread: {
    title: 'This draft is not on this device, and the farm did not answer.',
    text: 'If it was sent, it opens when there is signal. If it was not, it stays on the phone or computer it was typed on.',
  },
  overtaken: {
    title: 'This record was signed meanwhile as {number}.',
    text: 'What is typed here says something else and was not sent. It stays on this device until you discard it. To change what was signed, amend the record.',
  },
  discard: 'Discard what is typed here',
}
