/** Why nothing can be computed; each code has its own sentence. */
export type ProblemCode =
  | 'unknown-element'
  | 'charge-not-whole'
  | 'too-many-removed'
  | 'no-electron-left'
  | 'anion-beyond-shell'
  | 'configuration-needed'
  | 'configuration-not-understood'
  | 'electron-count'
  | 'electron-not-understood'
  | 'no-such-subshell'
  | 'empty-subshell'
  | 'outside-convention'
  | 'outside-quantity'
  | 'incomplete';

export interface Problem {
  readonly code: ProblemCode;
  /** A sentence that names what is wrong, ready to be shown. */
  readonly message: string;
  /** Where in the typed text, counted from 0. */
  readonly at?: number;
}

export type Result<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly problem: Problem };

export const found = <T>(value: T): Result<T> => ({ ok: true, value });

export const refused = <T>(code: ProblemCode, message: string, at?: number): Result<T> => ({
  ok: false,
  problem: at === undefined ? { code, message } : { code, message, at },
});
