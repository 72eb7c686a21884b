import * as z from 'zod'

export const ulidPattern = /^[0-7][0-9A-HJKMNP-TV-Z]{25}$/
/** An id as it stands in an address; opaque to callers. */
export const ulidSchema = z.string().regex(ulidPattern, 'This is not an id of Trotline.')
/** Routes that address one thing by its id. */
export const idParams = z.object({ id: ulidSchema })
