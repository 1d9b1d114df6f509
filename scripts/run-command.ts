/** Runs a command line program: a failure is one line for the person, with the whole story only on request. */
export function runCommand(main: (args: string[]) => Promise<number | void>): void {
  main(process.argv.slice(2)).then(
    (code) => {
      process.exitCode = code ?? 0;
    },
    (error: unknown) => {
      console.error(process.env.DEBUG ? error : error instanceof Error ? error.message : String(error));
      process.exitCode = 1;
    },
  );
}

/** Settles at Ctrl-C, or when the process is asked to end or loses its terminal. */
export function askedToStop(): Promise<void> {
  return new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => resolve());
  });
}
