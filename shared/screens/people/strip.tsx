import { createElement } from 'react';
import { stripUrl } from '../../client/people-and-paper';
import { words } from './words';

/** The cut-out of a hand-written number, as wide as it may be. */
export const Strip = ({ scriptId, version, width = 320 }: { scriptId: string; version: string; width?: number }) =>
  createElement('img', { src: stripUrl(scriptId, version), alt: words.strip, draggable: false, style: { width, maxWidth: '100%', height: 'auto', display: 'block', borderRadius: 2, boxShadow: '0 1px 3px rgba(10, 20, 30, 0.18)' } });
