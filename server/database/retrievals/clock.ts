import { sql } from 'drizzle-orm'

/** The database's own clock: what several hosts compare must come from one clock. */
export const databaseNow = sql<Date>`utc_timestamp(3)`

export const secondsAgo = (seconds: number) => sql`utc_timestamp(3) - interval ${seconds} second`
