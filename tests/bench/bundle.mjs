import { rmSync } from 'node:fs'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'esbuild'

export const here = path => fileURLToPath(new URL(path, import.meta.url))

/** Imports a TypeScript file of this folder; the bundle stands beside it, so that its relative places stay true. */
export async function load(name) {
  const outfile = here(`./.${name}-${process.pid}.mjs`)
  await build({ entryPoints: [here(`./${name}`)], bundle: true, platform: 'node', format: 'esm', packages: 'external', external: ['*.mjs'], outfile, logLevel: 'error' })
  try {
    return await import(pathToFileURL(outfile).href)
  }
  finally {
    rmSync(outfile)
  }
}
