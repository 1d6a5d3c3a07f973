const PREFIX = 'drenchleaf.'

/** A small setting of this device, or null where it was never set, is none of `allowed`, or storage is closed. */
export function readSetting<Value extends string>(name: string, allowed?: readonly Value[]): Value | null {
  try {
    const value = localStorage.getItem(PREFIX + name) as Value | null
    return value === null || (allowed !== undefined && !allowed.includes(value)) ? null : value
  } catch {
    return null
  }
}

/** Keeps a small setting; a device that refuses storage goes on without it. */
export function writeSetting(name: string, value: string | null): void {
  try {
    if (value === null) localStorage.removeItem(PREFIX + name)
    else localStorage.setItem(PREFIX + name, value)
  } catch {
    // Private windows may refuse: the setting then lasts as long as the page.
  }
}
