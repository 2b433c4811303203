import fc from 'fast-check';

/** Each mutant runs its properties again: fewer cases, and the same for every mutant. */
fc.configureGlobal({ numRuns: 25, seed: 1930 });
