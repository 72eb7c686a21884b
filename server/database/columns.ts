import { char, customType, datetime } from 'drizzle-orm/mysql-core'
import type * as z from 'zod'

/** ULID, 26 characters, binary collation so that order is time order. */
export const ulidColumn = () => char({ length: 26 })

/** UTC with milliseconds. */
export const timestampColumn = () => datetime({ fsp: 3, mode: 'date' })

/** MariaDB's JSON is LONGTEXT: stored as text, parsed by its schema when read, so that a bad row is found where it is read. */
export const jsonColumn = <S extends z.ZodType>(schema: S) =>
  customType<{ data: z.output<S>, driverData: string }>({
    dataType: () => 'longtext',
    toDriver: value => JSON.stringify(value),
    fromDriver: value => schema.parse(JSON.parse(value)) as z.output<S>,
  })()

/** JSON that our own code wrote and whose type is the engine's (results, pictures): not parsed field by field when read. */
export const trustedJsonColumn = <T>() =>
  customType<{ data: T, driverData: string }>({
    dataType: () => 'longtext',
    toDriver: value => JSON.stringify(value),
    fromDriver: value => JSON.parse(value) as T,
  })()

/** Compressed bytes. */
export const bytesColumn = () =>
  customType<{ data: Buffer, driverData: Buffer }>({ dataType: () => 'longblob' })()
