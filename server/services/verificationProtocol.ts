import type { AnalyseReply } from '#shared/solverApi.ts'

export interface ThreadTask {
  run: number
  document: unknown
}

export type ThreadAnswer =
  { ready: true } | { run: number; reply: AnalyseReply } | { run: number; fault: string }
