/** An element as it stands: text and elements in their order, comments and instructions left out. */
export interface XmlElement {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly (XmlElement | string)[];
}

/** Why a file is not read. */
export class XmlRefusal extends Error {}

const deepest = 40;
const mostElements = 20_000;
const named: Readonly<Record<string, string>> = { lt: '<', gt: '>', amp: '&', quot: '"', apos: "'" };
const nameAt = /[A-Za-z_][\w.:-]*/y;
const spaceAt = /[ \t\r\n]*/y;

const character = (code: number): string => {
  const isAllowed = code === 9 || code === 10 || code === 13 || (code >= 32 && code <= 0xd7ff) || (code >= 0xe000 && code <= 0xfffd) || (code >= 0x10000 && code <= 0x10ffff);
  if (!isAllowed) throw new XmlRefusal('It names a character that XML does not have.');
  return String.fromCodePoint(code);
};

/** The five names of XML and numbers only: a name that a file gives a meaning of its own is refused, not looked up. */
const decoded = (text: string): string =>
  text.replace(/&([^;&\s]{0,12});?/g, (whole: string, name: string) => {
    const known = whole.endsWith(';') && Object.hasOwn(named, name) ? named[name] : undefined;
    if (known !== undefined) return known;
    const number = whole.endsWith(';') ? /^#(?:x([0-9a-fA-F]{1,6})|(\d{1,7}))$/.exec(name) : null;
    if (!number) throw new XmlRefusal(`“${whole.slice(0, 16)}” is an entity; only those of XML itself are read.`);
    return character(number[1] === undefined ? parseInt(number[2] ?? '', 10) : parseInt(number[1], 16));
  });

interface Open {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: (XmlElement | string)[];
}

/** Reads along the text once, left to right; every step moves on, so time grows with the length alone. */
class Reader {
  private at = 0;
  private count = 0;
  constructor(private readonly text: string) {}

  read(): XmlElement {
    const outside: Open = { name: '', attributes: {}, children: [] };
    const open: Open[] = [outside];
    while (this.at < this.text.length) this.step(open);
    const roots = outside.children.filter((child): child is XmlElement => typeof child !== 'string');
    const [root] = roots;
    const isClean = outside.children.every((child) => typeof child !== 'string' || child.trim() === '');
    if (open.length > 1 || !root || roots.length > 1 || !isClean) throw new XmlRefusal('It is no whole XML document.');
    return root;
  }

  private step(open: Open[]): void {
    const top = open.at(-1);
    if (!top) throw new XmlRefusal('It is no whole XML document.');
    if (this.text[this.at] !== '<') {
      const end = this.text.indexOf('<', this.at);
      top.children.push(decoded(this.text.slice(this.at, end < 0 ? undefined : end)));
      this.at = end < 0 ? this.text.length : end;
    } else if (this.text.startsWith('<!--', this.at)) this.past('-->', 4);
    else if (this.text.startsWith('<![CDATA[', this.at)) top.children.push(this.past(']]>', 9));
    else if (this.text.startsWith('<?', this.at)) this.past('?>', 2);
    else if (this.text.startsWith('<!', this.at)) throw new XmlRefusal('It has a document type or entities of its own, which are not read.');
    else if (this.text.startsWith('</', this.at)) this.close(open);
    else this.open(open);
  }

  /** Moves behind a mark and gives what stood before it. */
  private past(mark: string, from: number): string {
    const end = this.text.indexOf(mark, this.at + from);
    if (end < 0) throw new XmlRefusal('It ends too early.');
    const within = this.text.slice(this.at + from, end);
    this.at = end + mark.length;
    return within;
  }

  private match(pattern: RegExp): string {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text)?.[0];
    if (found === undefined) throw new XmlRefusal('A name is missing in it.');
    this.at += found.length;
    return found;
  }

  private take(mark: string): void {
    if (!this.text.startsWith(mark, this.at)) throw new XmlRefusal(`“${mark}” is missing in it.`);
    this.at += mark.length;
  }

  private open(open: Open[]): void {
    this.at += 1;
    const name = this.match(nameAt);
    this.count += 1;
    if (this.count > mostElements) throw new XmlRefusal(`It has more than ${mostElements} elements.`);
    const element: Open = { name, attributes: this.attributes(), children: [] };
    open.at(-1)?.children.push(element);
    if (this.text[this.at] === '/') this.take('/>');
    else {
      this.take('>');
      open.push(element);
      if (open.length > deepest) throw new XmlRefusal(`Its elements are nested deeper than ${deepest}.`);
    }
  }

  private attributes(): Record<string, string> {
    const found: Record<string, string> = {};
    for (;;) {
      this.match(spaceAt);
      const next = this.text[this.at];
      if (next === undefined || next === '>' || next === '/') return found;
      const name = this.match(nameAt);
      this.match(spaceAt);
      this.take('=');
      this.match(spaceAt);
      const quote = this.text[this.at];
      if ((quote !== '"' && quote !== "'") || Object.hasOwn(found, name) || name === '__proto__') throw new XmlRefusal(`The attribute ${name} is not as XML has it.`);
      const value = this.past(quote, 1);
      if (value.includes('<')) throw new XmlRefusal(`The attribute ${name} is not as XML has it.`);
      found[name] = decoded(value);
    }
  }

  private close(open: Open[]): void {
    this.at += 2;
    const name = this.match(nameAt);
    this.match(spaceAt);
    this.take('>');
    if (open.length < 2 || open.pop()?.name !== name) throw new XmlRefusal(`</${name}> ends nothing.`);
  }
}

/** An XML document of UTF-8 bytes: no document type, no entities but those of XML, nothing from outside. Throws XmlRefusal. */
export function readXml(bytes: Uint8Array): XmlElement {
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new XmlRefusal('It is not written in UTF-8.');
  }
  if (text.includes('\u0000')) throw new XmlRefusal('It is not written in UTF-8.');
  return new Reader(text.replace(/\r\n?/g, '\n')).read();
}

export const elementsOf = (element: XmlElement): XmlElement[] => element.children.filter((child): child is XmlElement => typeof child !== 'string');

/** The elements of a name below an element, in order, at any depth. */
export const below = (element: XmlElement, name: string): XmlElement[] => elementsOf(element).flatMap((child) => [...(child.name === name ? [child] : []), ...below(child, name)]);

export const textOf = (element: XmlElement): string => element.children.map((child) => (typeof child === 'string' ? child : textOf(child))).join('');
