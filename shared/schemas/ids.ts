import * as z from 'zod'

/** An id as it stands in an address; opaque to callers. */
export const ulidSchema = z.string().regex(/^[0-9A-HJKMNP-TV-Z]{26}$/, 'This is not an id of this service.')
export const idParams = z.object({ id: ulidSchema })
