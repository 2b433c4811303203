import { createElement } from 'react';
import { faceOf } from './text';
import { useColors } from './theme';
import { radius } from './tokens';

export const contentId = 'content';

/** The first stop of the keyboard: over the rail to the content. Seen only while it has the focus. */
export function SkipLink() {
  const colors = useColors();
  return createElement(
    'a',
    {
      href: `#${contentId}`,
      'data-hides-from-sight': '',
      onClick: (event: { preventDefault(): void }) => {
        // The address belongs to the router.
        event.preventDefault();
        document.getElementById(contentId)?.focus();
      },
      style: { position: 'absolute', left: 12, top: 12, zIndex: 10, padding: '10px 16px', borderRadius: radius.control, backgroundColor: colors.paper, color: colors.ink, fontFamily: faceOf('body', 600), fontSize: 16, border: `1.5px solid ${colors.rule}` },
    },
    'To the content',
  );
}
