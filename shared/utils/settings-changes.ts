import type { RetrievalSettings } from '../schemas/settings'

export interface FieldChange { from: unknown, to: unknown }

/** Settings as a flat record, so that each can be compared and named by itself: `profile.fwhm`, `temperatureRange`, ... */
export const flatSettings = ({ profile, ...settings }: RetrievalSettings): Record<string, unknown> =>
  ({ ...settings, 'profile.shape': profile.shape, 'profile.fwhm': profile.fwhm })

/** The settings in which two recipes differ, in the order of the schema. */
export function settingsChanges(from: RetrievalSettings, to: RetrievalSettings): Record<string, FieldChange> {
  const [before, after] = [flatSettings(from), flatSettings(to)]
  return Object.fromEntries(Object.keys(after)
    .filter(key => JSON.stringify(before[key]) !== JSON.stringify(after[key]))
    .map(key => [key, { from: before[key], to: after[key] }]))
}
