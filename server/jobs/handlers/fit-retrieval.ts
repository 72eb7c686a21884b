import { executeRetrieval } from '../../services/retrievals/execute'
import type { FitRetrieval } from '../definitions/fit-retrieval'

export const fitRetrieval = (order: FitRetrieval, stopping: AbortSignal): Promise<void> => executeRetrieval(order, stopping)
