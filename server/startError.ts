/** Why the server does not start, in a sentence for the person who started it: printed without a stack, exit code 1. */
export class StartError extends Error {
  override name = 'StartError'
}
