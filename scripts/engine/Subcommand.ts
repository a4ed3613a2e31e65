/** Writes one line of JSON; wait for it, so that a slow reader is not run over. */
export type Print = (line: object) => Promise<void>;

/** Takes what stands behind its name on the command line and prints its answer line by line. */
export type Subcommand = (args: string[], print: Print) => Promise<void>;
