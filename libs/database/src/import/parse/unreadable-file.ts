import { PROBLEMS, type ProblemCode } from '@quarterpoise/dto';

export type UnreadableCode = Extract<
  ProblemCode,
  'import-too-large' | 'import-not-text' | 'import-empty' | 'import-columns-missing' | 'import-malformed-csv'
>;

/** The file as a whole cannot be taken; `detail` says why in a sentence, and where. Nothing of it may be used. */
export class UnreadableFile extends Error {
  override readonly name = 'UnreadableFile';
  constructor(
    readonly code: UnreadableCode,
    readonly detail: string,
    /** The line that is at fault, where there is one. */
    readonly line: number | null = null,
    options?: ErrorOptions,
  ) {
    super(`${PROBLEMS[code].title}: ${detail}`, options);
  }
}
