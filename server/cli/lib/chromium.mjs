import { existsSync } from 'node:fs'

/** Debian's builds, the quicker first: without a window of its own a page opens in a third of the time. */
const places = ['/usr/bin/chromium-headless-shell', '/usr/bin/chromium']

/** @returns {string | undefined} the browser that tests and pictures use, where one is installed */
export const findChromium = () => places.find((place) => existsSync(place))
