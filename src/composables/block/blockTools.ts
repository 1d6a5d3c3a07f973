import type { RouteLocationRaw } from 'vue-router'

/** What can be done to outlines. */
export const BLOCK_TOOLS = ['draw', 'reshape', 'split', 'merge', 'hole', 'snap', 'points'] as const
export type BlockTool = (typeof BLOCK_TOOLS)[number]
/** The tools of the page that changes one outline. */
export type ShapeTool = Extract<BlockTool, 'reshape' | 'hole' | 'snap' | 'points'>

/** The page that a tool opens. @param blockId the block it is for; null for none, or a new one. */
export function pageOfTool(tool: BlockTool, blockId: string | null): RouteLocationRaw {
  if (tool === 'draw' || (tool === 'points' && blockId === null)) return { name: 'block-new', query: { by: tool === 'draw' ? 'draw' : 'points' } }
  if (tool === 'merge') return { name: 'blocks-merge', query: blockId === null ? {} : { with: blockId } }
  if (blockId === null) return { name: 'blocks' }
  return tool === 'split' ? { name: 'block-split', params: { id: blockId } } : { name: 'block-shape', params: { id: blockId }, query: { tool } }
}

export function isShapeTool(words: unknown): words is ShapeTool {
  return words === 'reshape' || words === 'hole' || words === 'snap' || words === 'points'
}
