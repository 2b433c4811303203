import { describe, expect, it } from 'vitest';
import { elements } from '../../chemistry/elements';
import { placeInTable, searchElements } from './element-search';

const symbols = (text: string) => searchElements(text).map(({ symbol }) => symbol);

describe('finding an element', () => {
  it('takes a symbol, a name or an atomic number', () => {
    expect(symbols('fe')[0]).toBe('Fe');
    expect(symbols('iron')).toEqual(['Fe']);
    expect(symbols('26')).toEqual(['Fe']);
    expect(symbols('chlor')[0]).toBe('Cl');
  });

  it('puts the exact symbol before names that begin with it', () => {
    expect(symbols('c')[0]).toBe('C');
    expect(symbols('no')[0]).toBe('No');
  });

  it('gives all 118 for nothing, and none for nonsense', () => {
    expect(symbols('  ')).toHaveLength(118);
    expect(symbols('zzz')).toEqual([]);
  });
});

describe('the place of an element in the table', () => {
  it('is its own, for every element', () => {
    const places = elements.map((element) => JSON.stringify(placeInTable(element)));
    expect(new Set(places).size).toBe(118);
    for (const element of elements) {
      const { column, row } = placeInTable(element);
      expect(column >= 1 && column <= 18 && row >= 1 && row <= 9).toBe(true);
    }
  });
});
