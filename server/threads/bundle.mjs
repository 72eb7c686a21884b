import { fileURLToPath } from 'node:url'
import { build } from 'esbuild'

const here = path => fileURLToPath(new URL(path, import.meta.url))

/** The whole code of a thread as one text, so that it needs no place of its own in a build. */
export async function bundleThread() {
  const { outputFiles: [bundle] } = await build({
    entryPoints: [here('./main.ts')], bundle: true, write: false, platform: 'node', format: 'cjs', target: 'node20', alias: { '#shared': here('../../shared') }, logLevel: 'error',
  })
  return bundle.text
}
