import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The folder of this checkout, absolute. */
export const checkoutFolder = dirname(dirname(dirname(dirname(fileURLToPath(import.meta.url)))))

/** @param {...string} parts of a path inside the checkout */
export const inCheckout = (...parts) => join(checkoutFolder, ...parts)
