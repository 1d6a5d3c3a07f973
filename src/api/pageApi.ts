/** The page itself as the server gives it now. @throws where no answer comes, or another than the page. */
export async function readPage(): Promise<string> {
  const response = await fetch('/', { cache: 'no-store', headers: { Accept: 'text/html' } })
  if (!response.ok) throw new Error(`the page answered ${response.status}`)
  return response.text()
}
