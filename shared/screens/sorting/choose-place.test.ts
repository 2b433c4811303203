import { expect, it } from 'vitest';
import type { PagePlaceView } from '../../contracts/scans';
import { choosePlace, lacking, startOf } from './choose-place';

const place = (candidateNumber: string, pageNo: number, isIn: boolean): PagePlaceView => ({ candidateId: candidateNumber, candidateNumber, pageNo, image: isIn ? { id: `${candidateNumber}-${pageNo}`, rev: 1 } : null });
const places = [place('W1', 1, false), place('W1', 2, false), place('W2', 1, true), place('W2', 2, false), place('W3', 1, true), place('W3', 2, true)];

it('tells what a typed number and page come to', () => {
  expect(choosePlace(places, ' w2', '2')).toEqual({ kind: 'free', place: places[3] });
  expect(choosePlace(places, 'W2', '1').kind).toBe('taken');
  expect(choosePlace(places, 'W2', '3').kind).toBe('no-such-page');
  expect(choosePlace(places, 'W9', '1').kind).toBe('unknown');
  expect(choosePlace(places, '', '1').kind).toBe('nothing');
});

it('offers scripts that lack the page, begun ones first', () => {
  expect(lacking(places, '2').map(({ candidateNumber }) => candidateNumber)).toEqual(['W2', 'W1']);
});

it('starts with the place the file name speaks for', () => {
  const page = { id: 'p', fileName: 'x', bundle: 'A', why: '', likely: { candidateId: 'W2', pageNo: 2 }, rev: 1 };
  expect(startOf(page, places)).toEqual({ number: 'W2', pageNo: '2' });
  expect(startOf({ ...page, likely: null }, places)).toEqual({ number: '', pageNo: '1' });
});
