export interface RunningService {
  readonly name: string;
  readonly pid: number;
  /** Settles when the process has ended, by our wish or not, with the last thing it said. */
  readonly exited: Promise<string>;
  stop(): Promise<void>;
}
