import { ItemRefusal } from './refusal';
import type { XmlElement } from './read-xml';

const blocks = new Set(['p', 'div', 'li', 'ul', 'ol', 'h1', 'h2', 'h3', 'h4', 'h5', 'h6', 'br', 'qti-prompt', 'blockquote', 'qti-content-body']);
const inline = new Set(['span', 'em', 'strong', 'b', 'i', 'small', 'q', 'var', 'code', 'cite', 'abbr']);
const raised: Readonly<Record<string, string>> = { sup: '^', sub: '_' };

/** The words of a body as one line, and what in it takes answers. What cannot be printed as words is refused by its name. */
export function bodyText(body: XmlElement): { prompt: string; interactions: XmlElement[] } {
  const interactions: XmlElement[] = [];
  const walk = (element: XmlElement): string =>
    element.children
      .map((child) => {
        if (typeof child === 'string') return child;
        if (child.name.endsWith('-interaction')) {
          interactions.push(child);
          return ' ';
        }
        const mark = raised[child.name];
        if (mark !== undefined) return `${mark}${walk(child).trim()}`;
        if (inline.has(child.name)) return walk(child);
        if (blocks.has(child.name)) return ` ${walk(child)} `;
        throw new ItemRefusal(`Its body holds <${child.name}>, which cannot be printed as words.`);
      })
      .join('');
  const prompt = walk(body).replace(/\s+/g, ' ').replace(/ ([.,;:?!])/g, '$1').trim();
  return { prompt, interactions };
}
