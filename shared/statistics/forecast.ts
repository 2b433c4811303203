/** How second readings are asked for. */
export type SecondReadings =
  | { readonly policy: 'none' | 'all' }
  /** The share of all answers, or of those that nothing else asks to double. */
  | { readonly policy: 'share' | 'by risk'; readonly share: number };

/** What is counted or expected of a sitting, shares between 0 and 1. */
export interface Workload {
  /** Answers to be read: scripts times items, blanks too. */
  readonly answers: number;
  /** First and second readings that are done already. */
  readonly done: number;
  readonly secondsPerReading: number;
  /** Answers whose first reading would lose marks, or is a keying step from the key, or is flagged. */
  readonly atRisk: number;
  /** Pairs that differ, each of which is read a third time. */
  readonly discordant: number;
}

/** Readings a policy asks for, and the hours that those not done take. */
export interface Forecast {
  readonly first: number;
  readonly second: number;
  readonly third: number;
  readonly hours: number;
}

/**
 * Forecast hours of a second-reading policy, from expected shares; whole readings, hours as a number. Ours, no source. For 1,248
 * answers by risk, 63 % at risk and a share of 10 %: 786.24 + 46.176, or 832 second readings, which makes 2,080 in all.
 */
export function forecast({ answers, done, secondsPerReading, atRisk, discordant }: Workload, asked: SecondReadings): Forecast {
  const second = Math.round(answers * doubled(asked, atRisk));
  const third = Math.round(second * discordant);
  const left = Math.max(0, answers + second - done) + third;
  return { first: answers, second, third, hours: (left * secondsPerReading) / 3600 };
}

/** The share of answers that are read twice. */
function doubled(asked: SecondReadings, atRisk: number): number {
  if (asked.policy === 'share') return asked.share;
  if (asked.policy === 'by risk') return atRisk + (1 - atRisk) * asked.share;
  return asked.policy === 'all' ? 1 : 0;
}

/** The four choices side by side, in the order they are offered. Ours, no source; the same numbers. */
export const forecastChoices = (work: Workload, share: number): readonly (Forecast & { readonly asked: SecondReadings })[] =>
  ([{ policy: 'none' }, { policy: 'all' }, { policy: 'share', share }, { policy: 'by risk', share }] as const).map((asked) => ({ asked, ...forecast(work, asked) }));
