import { createHash, randomBytes } from 'node:crypto'

/** Plain JavaScript, so that the command-line scripts make and store tokens exactly as the server does. */

/** Marks our tokens, so that a leaked one is recognised for what it is. */
export const apiTokenPrefix = 'trl_'

/** 256 random bits, safe in a header and in an address. */
export const newSecret = () => randomBytes(32).toString('base64url')

export const newApiToken = () => `${apiTokenPrefix}${newSecret()}`

/** What is stored of a token. A plain hash suffices: nobody guesses 256 random bits. */
export const hashSecret = secret => createHash('sha256').update(secret).digest('hex')
