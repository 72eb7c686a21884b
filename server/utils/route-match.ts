export interface KnownRoute { route: string, method?: string }

/** Methods that some route takes at this path, in capitals; empty when no route has the path. */
export function methodsAt(path: string, routes: KnownRoute[]): string[] {
  const here = routes.filter(({ route }) => !route.includes('**') && matches(route, path))
  return [...new Set(here.map(({ method }) => (method ?? 'get').toUpperCase()))].sort()
}

function matches(route: string, path: string): boolean {
  const wanted = parts(route)
  const given = parts(path)
  return wanted.length === given.length && wanted.every((part, index) => part.startsWith(':') || part === given[index])
}

const parts = (path: string) => path.split('/').filter(Boolean)
