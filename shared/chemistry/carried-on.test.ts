import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canCarryOn, carriedValue } from './carried-on';
import { decimal, equals, subtract, toDecimals, toFigures, toFractionText, whole } from './exact';
import { elementByNumber } from './elements';
import { occupiedElectrons } from './configurations';
import { work, type AskedInput } from './work';

const chlorine = (quantity: string, convention = 'slater'): AskedInput => ({ symbol: 'Cl', charge: 0, electron: '3p', quantity, convention });
const own = (quantity: string, value: string) => ({ quantity, value: decimal(value) });
const carried = (asked: AskedInput, quantity: string, value: string) => carriedValue(asked, own(quantity, value));

describe('a value carried on from an earlier question', () => {
  // Z = 17 of chlorine; formulas of Slater, Phys. Rev. 36, 57 (1930): n* = 3 in shell 3.
  it('is worked by the formula of the later one', () => {
    expect(toDecimals(carried(chlorine('sigma'), 'zeff', '5.75') ?? whole(0), 2)).toBe('11.25');
    expect(toDecimals(carried(chlorine('zeff'), 'sigma', '11.25') ?? whole(0), 2)).toBe('5.75');
    // 13.605693 × (5.75/3)² = 49.9820, by hand.
    expect(toFigures(carried(chlorine('energy-ev'), 'zeff', '5.75') ?? whole(0), 4)).toBe('-49.98');
    expect(toFigures(carried(chlorine('energy-ev'), 'sigma', '11.25') ?? whole(0), 4)).toBe('-49.98');
    // 49.98 eV × 96.48533 kJ/mol an eV = 4822, by hand.
    expect(toFigures(carried(chlorine('energy-kj-mol'), 'energy-ev', '-49.98') ?? whole(0), 4)).toBe('-4822');
    expect(toFigures(carried(chlorine('energy-ev'), 'energy-kj-mol', '-4822') ?? whole(0), 4)).toBe('-49.98');
    // 9/5.75 × 52.9177 pm = 82.83, by hand.
    expect(toFigures(carried(chlorine('radius-pm'), 'zeff', '5.75') ?? whole(0), 4)).toBe('82.83');
    // 0.359 × 5.75/0.99² + 0.744 = 2.850: the printed value of chlorine where the electron counts itself (Allred and Rochow 1958).
    const contact = { ...chlorine('electronegativity'), radiusAngstrom: '0.99', countsItself: false };
    expect(toFigures(carried(contact, 'zeff', '5.75') ?? whole(0), 4)).toBe('2.850');
    expect(toFigures(carried({ ...contact, countsItself: true }, 'zeff', '6.10') ?? whole(0), 4)).toBe('2.850');
  });

  it('is not taken where no atom has it, or where it does not lead there', () => {
    expect(['-0.05', '17.05'].map((value) => carried(chlorine('sigma'), 'zeff', value))).toEqual([null, null]);
    expect(['0', '17'].map((value) => toFractionText(carried(chlorine('sigma'), 'zeff', value) ?? whole(-1)))).toEqual(['17', '0']);
    expect(['-0.05', '17.05'].map((value) => carried(chlorine('zeff'), 'sigma', value))).toEqual([null, null]);
    expect(carried(chlorine('radius-pm'), 'zeff', '0')).toBeNull();
    // The bare nucleus holds 3p with 13.605693 × (17/3)² = 436.9 eV.
    expect(carried(chlorine('energy-kj-mol'), 'energy-ev', '-436')).not.toBeNull();
    expect(carried(chlorine('energy-kj-mol'), 'energy-ev', '-437')).toBeNull();
    expect(carried(chlorine('zeff'), 'energy-ev', '-49.98')).toBeNull();
    expect(carried(chlorine('energy-ev', 'core-count'), 'zeff', '5.75')).toBeNull();
    expect(carried({ ...chlorine('sigma'), symbol: 'Xx' }, 'zeff', '5.75')).toBeNull();
    expect(carried({ ...chlorine('energy-kj-mol'), symbol: 'Fr', electron: '7s' }, 'energy-ev', '-4')).toBeNull();
  });

  it('of a difference takes the second from the rules until that is carried on too', () => {
    const other = { symbol: 'S', charge: 0, electron: '3p' };
    const asked = { ...chlorine('difference'), other };
    // S 3p is 5.45 by Slater's rules: 16 − (8 × 0.85 + 2 × 1.00 + 5 × 0.35).
    expect(toDecimals(carried(asked, 'zeff', '5.75') ?? whole(0), 2)).toBe('0.30');
    expect(toDecimals(carriedValue(asked, own('zeff', '5.75'), own('sigma', '10.90')) ?? whole(0), 2)).toBe('0.65');
    expect(carriedValue(asked, own('zeff', '5.75'), own('zeff', '17'))).toBeNull();
    expect(carried({ ...chlorine('difference') }, 'zeff', '5.75')).toBeNull();
    expect(carried({ ...asked, other: { ...other, electron: '4p' } }, 'zeff', '5.75')).toBeNull();
  });

  it('names what can be carried on', () => {
    expect(canCarryOn('zeff', 'energy-ev')).toBe(true);
    expect(canCarryOn('energy-ev', 'zeff')).toBe(false);
    expect(canCarryOn('zeff', 'zeff')).toBe(false);
    expect(canCarryOn('value', 'sigma')).toBe(false);
  });

  it('gives the key back when the right value is carried on, for any electron and quantity', () => {
    const electrons = Array.from({ length: 86 }, (_, index) => index + 1).flatMap((number) => {
      const element = elementByNumber(number);
      const occupied = element.ok ? occupiedElectrons(element.value.symbol, 0) : null;
      return element.ok && occupied?.ok ? occupied.value.map((electron) => ({ symbol: element.value.symbol, charge: 0, electron })) : [];
    });
    fc.assert(
      fc.property(fc.constantFrom(...electrons), fc.constantFrom('zeff', 'sigma'), fc.constantFrom('zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm'), (electron, from, to) => {
        fc.pre(from !== to);
        const source = work({ ...electron, quantity: from, convention: 'slater' });
        const target = work({ ...electron, quantity: to, convention: 'slater' });
        fc.pre(source.ok && target.ok);
        if (!source.ok || !target.ok) return;
        const value = carriedValue({ ...electron, quantity: to, convention: 'slater' }, { quantity: from, value: source.value.value });
        expect(value && equals(value, target.value.value)).toBe(true);
        expect(subtract(value ?? whole(0), target.value.value).n).toBe(0n);
      }),
    );
  });
});
