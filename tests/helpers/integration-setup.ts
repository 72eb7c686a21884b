import { startSharedStack } from './shared-stack'

export default () => startSharedStack('integration', 'accounts')
