import { DomainError } from '#shared/utils/domain-error'

/** The form's field `about`: JSON that holds for all files of the request; without it nothing is said. */
export function readAboutField(text: string | undefined): unknown {
  if (!text) return {}
  try {
    return JSON.parse(text)
  }
  catch {
    throw new DomainError('bad_request', 'The field "about" is not valid JSON.', [{ path: 'about', message: 'Send a JSON object such as {"axisUnit":"nm","medium":"vacuum"}.' }])
  }
}
