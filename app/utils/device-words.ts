const browsers: [RegExp, string][] = [[/Edg(?:e|A|iOS)?\//, 'Edge'], [/OPR\//, 'Opera'], [/Firefox\/|FxiOS\//, 'Firefox'], [/Chrom(?:e|ium)\/|CriOS\//, 'Chrome'], [/Safari\//, 'Safari']]
const systems: [RegExp, string][] = [[/Android/, 'Android'], [/iPhone|iPad/, 'iOS'], [/Windows/, 'Windows'], [/Mac OS X/, 'macOS'], [/CrOS/, 'ChromeOS'], [/Linux/, 'Linux']]

const named = (userAgent: string, names: [RegExp, string][]) => names.find(([pattern]) => pattern.test(userAgent))?.[1]

/** A browser and its system as people call them; more than this a browser does not tell reliably. */
export function deviceWords(userAgent: string): string {
  const browser = named(userAgent, browsers)
  const system = named(userAgent, systems)
  if (browser && system) return `${browser} on ${system}`
  return browser ?? system ?? (userAgent.slice(0, 60) || 'a program that does not say what it is')
}
