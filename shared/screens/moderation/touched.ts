interface Row {
  readonly answerId: string;
  readonly rev: number;
}

/** Rows already seen whose rev has moved on, without those changed by one's own act. */
export const touchedRows = (seen: ReadonlyMap<string, number>, rows: readonly Row[], own: ReadonlySet<string>): string[] =>
  rows.filter(({ answerId, rev }) => rev > (seen.get(answerId) ?? rev) && !own.has(answerId)).map(({ answerId }) => answerId);
