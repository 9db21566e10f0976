/** The solver in the page's worker: the API object of shared/solverApi.ts, exposed through Comlink. */
import { expose } from 'comlink'
import type { SolverApi } from '#shared/solverApi.ts'
import { analyse } from './solver/analyse.ts'

const api: SolverApi = {
  analyse: (document) => analyse(document, () => performance.now()),
}

expose(api)
