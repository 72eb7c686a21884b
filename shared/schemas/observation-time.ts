import * as z from 'zod'

const earliest = Date.UTC(1900, 0, 1)
/** A clock may run ahead by so much (common practice, no source). */
const toleranceMs = 10 * 60_000

/** Why a spectrum cannot have been taken at this time, in words; null when it can. */
export function implausibleTime(time: Date, now = Date.now()): string | null {
  const said = Number.isNaN(time.getTime()) ? '' : time.toISOString().replace(/\.000Z$/, 'Z')
  if (!said) return 'is no time of the calendar. Write it as 2011-12-16T08:55:07Z.'
  if (time.getTime() > now + toleranceMs) return `lies in the future (${said}; it is now ${new Date(now).toISOString().slice(0, 16)}Z). Check the station's clock and the time zone.`
  if (time.getTime() < earliest) return `lies before 1900 (${said}). Check the year.`
  return null
}

const calendar = z.iso.datetime({ offset: true })
const withoutZone = /^\d{4}-\d{2}-\d{2}([T ]\d{2}:\d{2}(:\d{2}(\.\d+)?)?)?$/

/** Why a text is no time of an observation; null when it is one. */
function timeProblem(text: string): string | null {
  if (withoutZone.test(text)) return `${text} has no ${text.includes(':') ? '' : 'clock and no '}time zone. Write it as 2011-12-16T08:55:07Z, with Z for UTC or the difference to it such as +01:00.`
  if (!calendar.safeParse(text).success) return `"${text.slice(0, 40)}" is not a time of the calendar with its zone. Write it as 2011-12-16T08:55:07.141Z.`
  const problem = implausibleTime(new Date(text))
  return problem && `The observation ${problem}`
}

/** When something was observed: a time with its zone, not in the future, not before 1900. */
export const observationTimeSchema = z.string({ message: 'observedAt is a time such as 2011-12-16T08:55:07.141Z.' }).superRefine((text, context) => {
  const message = timeProblem(text)
  if (message) context.addIssue({ code: 'custom', message })
}).meta({ format: 'date-time' })
