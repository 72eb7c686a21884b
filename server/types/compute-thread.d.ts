/** The code of a computing thread, bundled by server/threads/bundle.mjs. */
declare module '#compute-thread' {
  const source: string
  export default source
}
