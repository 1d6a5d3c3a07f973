/** From so many on, blocks are painted on a canvas: an element of the page for each would be slow to draw and to move. */
export const MANY_BLOCKS = 600

export const areMany = (blocks: readonly unknown[]): boolean => blocks.length >= MANY_BLOCKS
