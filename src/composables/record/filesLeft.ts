/** Photos and papers that were added before the signature have not reached the server yet: the signer is told once. */
export class FilesLeft extends Error {
  readonly count: number

  constructor(count: number) {
    super('Files are not sent yet')
    this.name = 'FilesLeft'
    this.count = count
  }
}
