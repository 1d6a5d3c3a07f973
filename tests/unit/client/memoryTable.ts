/** A table of the device kept in memory, with as much of Dexie as the stores use. */
export class MemoryTable<Row extends object> {
  readonly rows = new Map<string, Row>()
  /** Every key that was ever put: what once lay on the device. */
  readonly everPut: Row[] = []
  private readonly key: keyof Row

  constructor(key: keyof Row) {
    this.key = key
  }

  put(row: Row): Promise<void> {
    this.rows.set(String(row[this.key]), row)
    this.everPut.push(structuredClone(row))
    return Promise.resolve()
  }

  get(key: string): Promise<Row | undefined> {
    return Promise.resolve(this.rows.get(key))
  }

  delete(key: string): Promise<void> {
    this.rows.delete(key)
    return Promise.resolve()
  }

  clear(): Promise<void> {
    this.rows.clear()
    return Promise.resolve()
  }

  update(key: string, change: Partial<Row>): Promise<void> {
    const row = this.rows.get(key)
    if (row !== undefined) this.rows.set(key, { ...row, ...change })
    return Promise.resolve()
  }

  orderBy(field: keyof Row): { toArray: () => Promise<Row[]> } {
    return { toArray: () => Promise.resolve([...this.rows.values()].sort((a, b) => String(a[field]).localeCompare(String(b[field])))) }
  }
}
