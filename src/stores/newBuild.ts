import { readPage } from '../api/pageApi.ts'
import { draftWriter } from './draftWriter.ts'

/** What reads the page again; a test puts its own. */
interface PageEnds { readPage: () => Promise<string>; open: (address: string) => void }

const browser: PageEnds = { readPage, open: (address) => { window.location.assign(address) } }
const TRIED = 'drenchleaf.newBuild'

/**
 * A part of the page could not be read. Where the server has a new build, whose files have other names, the page is opened anew at
 * the wanted address, once a build, with what was typed kept; without signal nothing happens.
 * @returns whether the page is being opened anew.
 */
export async function openNewBuild(address: string, { readPage: read, open }: PageEnds = browser): Promise<boolean> {
  const page = await read().catch(() => '')
  const entry = entryOf(new DOMParser().parseFromString(page, 'text/html'))
  if (entry === null || entry === entryOf(document) || sessionStorage.getItem(TRIED) === entry) return false
  sessionStorage.setItem(TRIED, entry)
  // Copies of drafts stand already; the database is the better place.
  await draftWriter.flush().catch(() => undefined)
  open(address)
  return true
}

/** The page's first script, whose name is new with each build. */
function entryOf(page: Document): string | null {
  return page.querySelector('script[type="module"][src]')?.getAttribute('src') ?? null
}
