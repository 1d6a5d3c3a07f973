/** A picture of the ground under the blocks, one square of the web map's grid at a time. */
export interface TileSource {
  /** @returns the square's picture with its type. z 0–22; x, y within the grid of z. */
  read(z: number, x: number, y: number): Promise<{ contentType: string; bytes: Buffer }>
}
