import { expect, it } from 'vitest';
import { plainNumber } from '../../marking/read-typed';
import { isWhole } from './typed-item';

it('takes a value or a code, and no half of one', () => {
  const typed = (text: string, code: 'blank' | null = null) => isWhole({ text, code, method: [] }, plainNumber);
  expect([typed('6.10'), typed('', 'blank'), typed(''), typed('6.'), typed('6.1.0')]).toEqual([true, true, false, false, false]);
});
