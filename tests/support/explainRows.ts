interface PlanNode {
  'Node Type': string
  'Relation Name'?: string
  'Actual Rows': number
  'Actual Loops': number
  'Rows Removed by Filter'?: number
  'Rows Removed by Index Recheck'?: number
  Plans?: PlanNode[]
}

/** How many rows of tables a statement read, kept or thrown away, and the nodes that read them. */
export interface RowsRead { rows: number; nodes: string[] }

/** Reads an answer of `EXPLAIN (ANALYZE, TIMING OFF, FORMAT JSON)`. */
export function rowsRead([answer]: { 'QUERY PLAN': { Plan: PlanNode }[] }[]): RowsRead {
  const scans = answer === undefined ? [] : flatten(answer['QUERY PLAN'][0]?.Plan).filter((node) => node['Relation Name'] !== undefined)
  const rowsOf = (node: PlanNode) =>
    (node['Actual Rows'] + (node['Rows Removed by Filter'] ?? 0) + (node['Rows Removed by Index Recheck'] ?? 0)) * node['Actual Loops']
  return {
    rows: scans.reduce((sum, node) => sum + rowsOf(node), 0),
    nodes: scans.map((node) => `${node['Node Type']} on ${node['Relation Name']}: ${rowsOf(node)}`),
  }
}

function flatten(node: PlanNode | undefined): PlanNode[] {
  return node === undefined ? [] : [node, ...(node.Plans ?? []).flatMap(flatten)]
}
