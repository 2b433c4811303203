import { describe, expect, it } from 'vitest';
import { textOf } from './read-text';

describe('the text of a class list file', () => {
  it('is UTF-8, with or without its mark', async () => {
    expect(await textOf(new Blob(['W1,Ünal']))).toEqual({ ok: true, text: 'W1,Ünal' });
    expect(await textOf(new Blob(['\uFEFFW1']))).toEqual({ ok: true, text: 'W1' });
  });

  it('may be two-byte text as spreadsheets write it', async () => {
    const bytes = new Uint8Array([0xff, 0xfe, ...[...'W1;Ü'].flatMap((letter) => [letter.charCodeAt(0) & 255, letter.charCodeAt(0) >> 8])]);
    expect(await textOf(new Blob([bytes]))).toEqual({ ok: true, text: 'W1;Ü' });
  });

  it('is refused when it is in another encoding, or too large', async () => {
    expect(await textOf(new Blob([new Uint8Array([87, 49, 44, 0xdc, 110])]))).toMatchObject({ ok: false, message: expect.stringContaining('UTF-8') });
    expect(await textOf(new Blob([new Uint8Array(1_000_001)]))).toMatchObject({ ok: false });
  });
});
