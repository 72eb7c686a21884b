import { createStack, destroyStack, seed, startWeb, startWorker } from './stack'

/** The stack that integration and browser tests share; tests find it through the environment. */
export async function startSharedStack(name: string, what: 'accounts' | 'demo'): Promise<() => Promise<void>> {
  const stack = await createStack(name)
  try {
    const web = await startWeb(stack)
    await startWorker(stack)
    await seed(stack, what)
    Object.assign(process.env, {
      TROTLINE_TEST_ORIGIN: stack.origin,
      TROTLINE_TEST_DATABASE_URL: stack.databaseUrl,
      TROTLINE_TEST_REDIS_URL: stack.redisUrl,
      TROTLINE_TEST_MAILDEV_URL: stack.maildevUrl,
      TROTLINE_TEST_STORAGE_DIR: stack.storageFolder,
      TROTLINE_TEST_ENV_FILE: `${stack.folder}/run/env`,
      TROTLINE_TEST_WEB_PID: String(web.pid),
    })
  }
  catch (error) {
    await destroyStack(stack)
    throw error
  }
  return () => destroyStack(stack)
}
