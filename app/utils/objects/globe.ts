interface Point { x: number, y: number }
const radians = (degrees: number) => degrees * Math.PI / 180

/**
 * Orthographic projection: the globe from far away, on a disc of radius 1 with y downwards, as seen from above
 * (latitude, longitude); null behind the limb. Snyder, Map Projections, USGS Professional Paper 1395 (1987), eq. 20-3 to 20-5.
 */
export function onGlobe(latitude: number, longitude: number, above: { latitude: number, longitude: number }): Point | null {
  const [phi, phi1, lambda] = [radians(latitude), radians(above.latitude), radians(longitude - above.longitude)]
  const towardsUs = Math.sin(phi1) * Math.sin(phi) + Math.cos(phi1) * Math.cos(phi) * Math.cos(lambda)
  if (towardsUs < 0) return null
  return { x: Math.cos(phi) * Math.sin(lambda), y: -(Math.cos(phi1) * Math.sin(phi) - Math.sin(phi1) * Math.cos(phi) * Math.cos(lambda)) }
}

/** The visible part of a curve as an SVG path. */
function pathOf(points: (Point | null)[]): string {
  let path = ''
  let drawing = false
  for (const point of points) {
    if (point) path += `${drawing ? 'L' : 'M'}${point.x.toFixed(3)} ${point.y.toFixed(3)}`
    drawing = point !== null
  }
  return path
}

const steps = (from: number, to: number, step: number) => Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step)

/** The grid of the globe every 30 degrees, the equator and the meridian of Greenwich apart, and where the place is. */
export function globeOf(place: { latitude: number, longitude: number }) {
  const above = { latitude: place.latitude / 2, longitude: place.longitude }
  const parallel = (latitude: number) => pathOf(steps(-180, 180, 5).map(longitude => onGlobe(latitude, longitude, above)))
  const meridian = (longitude: number) => pathOf(steps(-90, 90, 5).map(latitude => onGlobe(latitude, longitude, above)))
  return {
    grid: [...[-60, -30, 30, 60].map(parallel), ...steps(-150, 180, 30).filter(longitude => longitude !== 0).map(meridian)].join(''),
    equator: parallel(0),
    greenwich: meridian(0),
    place: onGlobe(place.latitude, place.longitude, above)!,
  }
}
