/** A table of the device kept in memory, with as much of it as the stores use. */
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

  async change(key: string, turn: (before: Row | undefined) => Row | undefined): Promise<Row | undefined> {
    const before = this.rows.get(key)
    const after = turn(before)
    if (after !== undefined) await this.put(after)
    return after ?? before
  }

  all(): Promise<Row[]> {
    return Promise.resolve([...this.rows.values()])
  }

  count(): Promise<number> {
    return Promise.resolve(this.rows.size)
  }
}
