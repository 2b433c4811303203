import PDFDocument from 'pdfkit';
import { expect, it } from 'vitest';
import { paragraph } from './print-paragraph';

const part = (text: string) => ({ fount: 'text', size: 12, text }) as const;
const sheet = () => new PDFDocument({ size: 'A4', margin: 51, bufferPages: true });
const lines = (text: string): number => {
  const document = sheet();
  const { y } = document;
  paragraph(document, part(text));
  return Math.round((document.y - y) / (12 * 1.32));
};

it('breaks lines between words only, however many founts a word needs', () => {
  expect(lines('find σ of it')).toBe(1);
  const document = sheet();
  const room = document.page.width - 102 - paragraph(document, part('')).widthOfString('Mg');
  const filling = 'i '.repeat(Math.floor(room / document.widthOfString('i ')));
  // The symbol has room for itself, its charge has not: both go to the next line, and what follows starts there.
  expect([lines(`${filling}Mg`), lines(`${filling}Mg²⁺`), lines(`${filling}Mg²⁺ ${filling.slice(0, -8)}`)]).toEqual([1, 2, 2]);
});

it('keeps breaks that were typed, cuts what has no space, and goes on over the page', () => {
  expect(lines('one\ntwo')).toBe(2);
  expect(lines('x'.repeat(200))).toBeGreaterThan(2);
  const document = sheet();
  for (let item = 0; item < 60; item += 1) paragraph(document, part(`${item} find Z_eff of Mg²⁺`));
  expect(document.bufferedPageRange().count).toBe(2);
});
