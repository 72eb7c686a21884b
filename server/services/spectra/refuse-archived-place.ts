import { DomainError } from '#shared/utils/domain-error'

interface Named { name: string, archivedAt: Date | null }
const nouns = ['station', 'instrument'] as const
type Places = Partial<Record<(typeof nouns)[number], Named | undefined>>

/** Nothing new is put at a station or under an instrument that is archived. `within` is where the request names them. */
export function refuseArchivedPlace(within: string, places: Places): void {
  for (const noun of nouns) {
    const place = places[noun]
    if (place?.archivedAt) {
      throw new DomainError('archived', `The ${noun} "${place.name}" is archived. Name another one, or ask an analyst or the lead to bring it back.`, [{ path: `${within}.${noun}`, message: `This ${noun} is archived.` }])
    }
  }
}
