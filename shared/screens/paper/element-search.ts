import { elements, type ChemicalElement } from '../../chemistry/elements';

/** Elements that fit a typed symbol, name or atomic number; the exact symbol first, then those that begin with the text. */
export function searchElements(text: string): readonly ChemicalElement[] {
  const wanted = text.trim().toLowerCase();
  if (wanted === '') return elements;
  const rank = ({ symbol, name, number }: ChemicalElement): number => {
    if (symbol.toLowerCase() === wanted || String(number) === wanted) return 0;
    if (name.toLowerCase().startsWith(wanted)) return 1;
    if (symbol.toLowerCase().startsWith(wanted)) return 2;
    return name.toLowerCase().includes(wanted) ? 3 : 4;
  };
  return elements
    .map((element) => ({ element, at: rank(element) }))
    .filter(({ at }) => at < 4)
    .sort((one, other) => one.at - other.at || one.element.number - other.element.number)
    .map(({ element }) => element);
}

/** Column 1 to 18 and row 1 to 9 in the table as it is usually printed: the f block stands below, under its own rows 8 and 9. */
export function placeInTable({ group, period, number }: ChemicalElement): { column: number; row: number } {
  if (group !== null) return { column: group, row: period };
  const first = period === 6 ? 57 : 89;
  return { column: number - first + 3, row: period + 2 };
}
