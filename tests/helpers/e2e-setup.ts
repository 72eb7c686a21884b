import { startSharedStack } from './shared-stack'

export default () => startSharedStack('e2e', 'demo')
