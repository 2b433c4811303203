import { describe, expect, it } from 'vitest';
import { commandOf, type KeyPlace, type KeyPress } from './keys';

const press = (key: string, held: Partial<KeyPress> = {}): KeyPress => ({ key, ctrlKey: false, metaKey: false, altKey: false, shiftKey: false, isComposing: false, ...held });
const empty: KeyPlace = { kind: 'commands', isEmpty: true };
const filled: KeyPlace = { kind: 'commands', isEmpty: false };
const elsewhere: KeyPlace = { kind: 'elsewhere' };
const field: KeyPlace = { kind: 'field' };

describe('keys as commands', () => {
  it('takes letters while the field of commands is empty', () => {
    expect(commandOf(press('b'), empty)).toBe('B');
    expect(commandOf(press('B'), elsewhere)).toBe('B');
  });

  it('leaves every character to a field with content', () => {
    expect(commandOf(press('b'), filled)).toBeNull();
    expect(commandOf(press('?'), filled)).toBeNull();
  });

  it('keeps Enter, Escape and the page keys as commands in a field with content', () => {
    expect(commandOf(press('Enter'), filled)).toBe('Enter');
    expect(commandOf(press('Escape'), filled)).toBe('Escape');
    expect(commandOf(press('PageUp'), filled)).toBe('PageUp');
  });

  it('leaves all but Escape to any other field', () => {
    expect(commandOf(press('b'), field)).toBeNull();
    expect(commandOf(press('Enter'), field)).toBeNull();
    expect(commandOf(press('Escape'), field)).toBe('Escape');
  });

  it('tells a letter with Shift from the letter', () => {
    expect(commandOf(press('Z', { shiftKey: true }), elsewhere)).toBe('Shift+Z');
    expect(commandOf(press('?', { shiftKey: true }), elsewhere)).toBe('?');
  });

  describe('edge cases', () => {
    it("leaves the browser's own combinations alone", () => {
      expect(commandOf(press('b', { ctrlKey: true }), elsewhere)).toBeNull();
      expect(commandOf(press('b', { metaKey: true }), elsewhere)).toBeNull();
    });

    it('asks for Alt where letters are set so, whatever character Alt makes of the key', () => {
      expect(commandOf(press('∫', { altKey: true, code: 'KeyB' }), elsewhere, 'alt')).toBe('B');
      expect(commandOf(press('b'), elsewhere, 'alt')).toBeNull();
      expect(commandOf(press('/'), elsewhere, 'alt')).toBe('/');
    });

    it('ignores letters where they are off, and text that is still being composed', () => {
      expect(commandOf(press('b'), elsewhere, 'off')).toBeNull();
      expect(commandOf(press('b', { isComposing: true }), elsewhere)).toBeNull();
    });
  });
});
