import type { RegisterLine } from '../register/registerLine.ts'

/** Work that waits for a signature: the reader's own, and that of others. */
export interface OpenWork {
  own: RegisterLine[]
  others: RegisterLine[]
}

/**
 * Parts what is begun by whose work it is; each part keeps its order.
 * @param ownName the reader's name as it stands in records. A draft of this device is always the reader's own.
 */
export function partOpenWork(lines: readonly RegisterLine[], ownName: string): OpenWork {
  const isOwn = ({ onDevice, by }: RegisterLine): boolean => onDevice || by === ownName
  return { own: lines.filter(isOwn), others: lines.filter((line) => !isOwn(line)) }
}
