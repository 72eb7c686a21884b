import { describe, expect, it } from 'vitest'
import { implausibleTime, observationTimeSchema } from '#shared/schemas/observation-time'

const wordsFor = (time: unknown) => observationTimeSchema.safeParse(time).error?.issues[0]?.message ?? null
const inMinutes = (minutes: number) => new Date(Date.now() + minutes * 60_000).toISOString()

describe('the time of an observation', () => {
  it('is taken with a zone, to the millisecond, as long ago as 1900 and as late as a clock that runs ten minutes ahead', () => {
    for (const time of ['2011-12-16T08:55:07.141Z', '2011-12-16T08:55:07+13:45', '1900-01-01T00:00:00Z', inMinutes(9)]) expect([time, wordsFor(time)]).toEqual([time, null])
  })

  it.each<[string, unknown, RegExp]>([
    ['without a time zone', '2011-12-16T08:55:07', /has no time zone.*Z for UTC/],
    ['with a blank in place of T and no zone', '2011-12-16 08:55', /has no time zone/],
    ['a day alone', '2011-12-16', /no clock and no time zone/],
    ['in the future', inMinutes(11), /lies in the future .*clock and the time zone/],
    ['before 1900', '1899-12-31T23:59:59Z', /before 1900.*Check the year/],
    ['in the year 1', '0001-01-01T00:00:00Z', /before 1900/],
    ['on a day that does not exist', '2011-02-30T00:00:00Z', /not a time of the calendar/],
    ['in a zone that does not exist', '2011-02-03T00:00:00+25:00', /not a time of the calendar/],
    ['no text', 20111216, /a time such as/],
    ['a long text', 'x'.repeat(5000), /^"x{40}" is not a time/],
  ])('is refused %s', (_, time, words) => expect(wordsFor(time)).toMatch(words))

  it('of a date that is none is refused too', () => expect(implausibleTime(new Date('nonsense'))).toMatch(/no time of the calendar/))
})
