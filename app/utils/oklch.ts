/** sRGB channels (0..1, clipped to the gamut) of an OKLCH colour. Matrices: Björn Ottosson, "A perceptual color space for image processing" (2020). */
export function oklchToLinearRgb(lightness: number, chroma: number, hueDegrees: number): [number, number, number] {
  const hue = hueDegrees * Math.PI / 180
  const a = chroma * Math.cos(hue)
  const b = chroma * Math.sin(hue)
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3
  const clip = (value: number) => Math.min(1, Math.max(0, value))
  return [
    clip(4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s),
    clip(-1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s),
    clip(-0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s),
  ]
}

const encode = (linear: number): number => linear <= 0.0031308 ? 12.92 * linear : 1.055 * linear ** (1 / 2.4) - 0.055

/** `0.45 0.12 250` (the body of a token) as `rgb(...)`: the canvas of a chart does not mix oklch colours. */
export function tokenToRgb(token: string): string {
  const [lightness, chroma, hue] = token.trim().split(/\s+/).map(Number)
  const channels = oklchToLinearRgb(lightness ?? 0, chroma ?? 0, hue ?? 0).map(c => Math.round(encode(c) * 255))
  return `rgb(${channels.join(', ')})`
}

/** Relative luminance as WCAG 2.2 defines it. */
export function tokenLuminance(token: string): number {
  const [lightness, chroma, hue] = token.trim().split(/\s+/).map(Number)
  const [red, green, blue] = oklchToLinearRgb(lightness ?? 0, chroma ?? 0, hue ?? 0)
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue
}

/** Contrast ratio of two tokens, 1..21. */
export function tokenContrast(one: string, other: string): number {
  const [low, high] = [tokenLuminance(one), tokenLuminance(other)].sort((a, b) => a - b) as [number, number]
  return (high + 0.05) / (low + 0.05)
}
