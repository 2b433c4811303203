import { createHmac } from 'node:crypto';
import { digitsOfCode, digitsUnderCheck, type CheckOf } from '../../shared/sheets/identity';

const checkDigits = digitsOfCode - digitsUnderCheck;

/** The check of printed codes: HMAC-SHA256 of the digits under a secret of the installation, its first six bytes taken as a number, its last six decimal digits. */
export const checkWith = (secret: string): CheckOf => (digits) => {
  const number = createHmac('sha256', secret).update(digits).digest().readUIntBE(0, 6);
  return String(number % 10 ** checkDigits).padStart(checkDigits, '0');
};
