import type { InstrumentForm, InstrumentView } from '#shared/schemas/instrument'
import { choice, quantity, text, type FieldWords } from '~/utils/objects/field-words'
import { observableWords } from '~/utils/setting-words'
import { axisUnitWords, mediumWords, valueKindWords } from '~/utils/spectrum-words'

export const instrumentFields: FieldWords[] = [
  text('name', 'Name'),
  text('slug', 'Address'),
  text('station', 'Station', 'none'),
  choice('axisUnit', 'Unit of the axis', axisUnitWords),
  choice('medium', 'Medium of the axis', mediumWords),
  choice('valueKind', 'Values count', valueKindWords),
  choice('defaultObservable', 'Observable by default', observableWords),
  quantity('fwhm', 'Line width', 'nm'),
  quantity('resolvingPower', 'Resolving power', ''),
  text('notes', 'Notes', 'none'),
]

export const emptyInstrument = (station: string | null = null): InstrumentForm =>
  ({ slug: '', name: '', station, axisUnit: null, medium: null, valueKind: null, defaultObservable: null, fwhm: null, resolvingPower: null, notes: '' })

export const instrumentForm = ({ id: _, archivedAt: __, createdAt: ___, version: ____, ...form }: InstrumentView): InstrumentForm => form
