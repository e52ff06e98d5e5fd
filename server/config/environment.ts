/** The environment as it is, for `parseConfig` and for programs that are started. */
export function readEnvironment(): Readonly<NodeJS.ProcessEnv> {
  return process.env;
}
