/** A file or page that is not taken; the message is a sentence for the person who sent it. */
export class InputRefusal extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'InputRefusal';
  }
}

export const damaged = 'The file is incomplete or damaged. Scan or upload it again.';

export const tooManyPages = (pages: number, most: number): string => `The file holds ${pages.toLocaleString('en-GB')} pages; ${most.toLocaleString('en-GB')} are the most. Split it into several files.`;
