import { slipCatalogue } from './catalogue';

const alphabet = 'abcdefghijklmnopqrstuvwxyz';

/** a to z, then aa, ab: the letter of the nth thing, from 0. */
const letterOf = (index: number): string => (index < alphabet.length ? '' : (alphabet[Math.floor(index / alphabet.length) - 1] ?? '')) + (alphabet[index % alphabet.length] ?? '');

const letters: ReadonlyMap<string, string> = new Map(slipCatalogue.map(({ id }, index) => [id, letterOf(index)]));

/** The letter of a slip, the same on every paper: by its place in the catalogue, the commonest first. slipLetter('counts-itself') is "a". */
export const slipLetter = (id: string): string => letters.get(id) ?? '?';
