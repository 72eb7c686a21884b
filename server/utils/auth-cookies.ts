import { config } from '../config'

export interface CookieNames { session: string, csrf: string, callback: string, secure: boolean }

/**
 * Names of our cookies. On https they carry the __Host- prefix, so that no sibling domain can set them; on plain
 * loopback that prefix is not allowed, and as cookies ignore ports each instance has names of its own.
 */
export function cookieNames(origin = config().origin, instance = config().instance): CookieNames {
  const secure = origin.startsWith('https:')
  const base = `${secure ? '__Host-' : ''}trotline-${instance}`
  // No name may begin with another one's: the library takes such cookies for pieces of the shorter one.
  return { session: `${base}-session`, csrf: `${base}-csrf`, callback: `${base}-callback`, secure }
}
