/** First that fits: browsers and systems name others beside themselves. */
const BROWSERS: readonly [RegExp, string][] = [
  [/\bEdgA?\//, 'Edge'], [/\bOPR\//, 'Opera'], [/\bSamsungBrowser\//, 'Samsung Internet'], [/\b(?:Firefox|FxiOS)\//, 'Firefox'],
  [/\b(?:Chrome|CriOS|HeadlessChrome)\//, 'Chrome'], [/\bVersion\/[\d.]+.*\bSafari\//, 'Safari'],
]
const SYSTEMS: readonly [RegExp, string][] = [
  [/\biPad\b/, 'iPad'], [/\biPhone\b/, 'iPhone'], [/\bAndroid\b/, 'Android'], [/\bCrOS\b/, 'ChromeOS'], [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b|\bMacintosh\b/, 'macOS'], [/\bLinux\b/, 'Linux'],
]
/** A header may be as long as its sender likes; names stand at its beginning and its end. */
const LONGEST = 500

/** Which browser on which system sent a request, "Firefox, Android", from its User-Agent; null where it names neither. Names only: no version, no model. */
export function deviceWords(userAgent: string | undefined): string | null {
  const text = (userAgent ?? '').slice(0, LONGEST)
  const found = [BROWSERS, SYSTEMS].flatMap((names) => names.find(([mark]) => mark.test(text))?.[1] ?? [])
  return found.length === 0 ? null : found.join(', ')
}
