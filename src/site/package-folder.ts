import { fileURLToPath } from 'node:url'

/** The package's own folder, wherever it is installed; templates and the Eleventy configuration lie in it. */
export const packageFolder = fileURLToPath(new URL('../../', import.meta.url))
