import type { SessionData, SessionUser } from '#shared/types/account'

/** Who is signed in, as the session says; null for a visitor. */
export function useSessionUser() {
  const { data } = useAuth()
  return computed<SessionUser | null>(() => (data.value as SessionData | null | undefined)?.user ?? null)
}
