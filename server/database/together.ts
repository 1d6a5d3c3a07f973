/**
 * Statements of one transaction that need nothing of each other, sent together rather than one after the other's answer. Waits for
 * all of them even where one fails: none may still be on its way when the transaction is taken back.
 * @throws what failed first; what fails after it only says that the transaction is over.
 */
export async function together<Answers extends readonly unknown[]>(asked: { [Key in keyof Answers]: Promise<Answers[Key]> | Answers[Key] }): Promise<Answers> {
  const faults: unknown[] = []
  await Promise.all(asked.map(async (one) => {
    try {
      await one
    } catch (fault) {
      faults.push(fault)
    }
  }))
  if (faults.length > 0) throw faults[0]
  return Promise.all(asked) as Promise<unknown> as Promise<Answers>
}
