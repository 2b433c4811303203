import { Fragment } from 'react';
import { Raised, Symbol, Zeff } from '../ui/symbol';
import type { TypeStyle } from '../ui/tokens';
import { chemParts } from './chem-text-parts';

/** A wording or a label as our type sets it; place it inside a Text of the same style. */
export function ChemText({ children, beside = 'body' }: { children: string; beside?: TypeStyle }) {
  return chemParts(children).map((part, index) => (
    <Fragment key={index}>
      {part.kind === 'zeff' ? <Zeff beside={beside} /> : null}
      {part.kind === 'symbol' ? <Symbol beside={beside}>{part.text}</Symbol> : null}
      {part.kind === 'raised' ? <Raised beside={beside}>{part.text}</Raised> : null}
      {part.kind === 'plain' ? part.text : null}
    </Fragment>
  ));
}
