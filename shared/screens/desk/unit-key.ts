/**
 * The text with its unit, and with the next of the list each time it is asked for again; after the last one without.
 * withNextUnit('13.6', ['eV', 'kJ/mol']) is '13.6 eV', then '13.6 kJ/mol', then '13.6'.
 */
export function withNextUnit(text: string, units: readonly string[]): string {
  const bare = text.trimEnd();
  // The longest first: one unit may end like another.
  const here = [...units].sort((one, other) => other.length - one.length).find((unit) => bare.endsWith(unit));
  const value = here === undefined ? bare : bare.slice(0, -here.length).trimEnd();
  const next = units[here === undefined ? 0 : units.indexOf(here) + 1];
  return next === undefined || value === '' ? value : `${value} ${next}`;
}
