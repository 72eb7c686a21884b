import type { StationForm, StationView } from '#shared/schemas/station'
import { quantity, text, type FieldWords } from '~/utils/objects/field-words'

export const stationFields: FieldWords[] = [
  text('name', 'Name'),
  text('slug', 'Address'),
  quantity('latitude', 'Latitude', '°'),
  quantity('longitude', 'Longitude', '°'),
  quantity('altitude', 'Altitude', 'm'),
]

export const emptyStation = (): StationForm => ({ slug: '', name: '', latitude: null, longitude: null, altitude: null })

export const stationForm = ({ slug, name, latitude, longitude, altitude }: StationView): StationForm => ({ slug, name, latitude, longitude, altitude })
