/** Pictures of the ground, one square of the web map's grid at a time. */
export interface TileSource {
  /** Whose pictures they are, to stand on the map. */
  attribution: string
  /** Closer than this there are none. */
  maxZoom: number
  /**
   * @returns the square's picture with its type. z 0 to 22; x, y within the grid of z.
   * @throws {AppError} not-found where the service has no such square, `unavailable` where it does not answer as it should.
   */
  read(z: number, x: number, y: number): Promise<Tile>
}
export interface Tile { contentType: string; bytes: Buffer }
