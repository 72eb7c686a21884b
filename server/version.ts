import manifest from '../package.json'

/** Of this application. */
export const version: string = manifest.version
