import { createElement } from 'react';

interface ScanPictureProps {
  readonly src: string;
  readonly alt: string;
  readonly width: number;
  readonly height: number;
  /** Quarter turns clockwise. */
  readonly turns: number;
}

/** A picture of paper, exactly as large as said. The browser's own image: the next replaces the last in one step. */
export function ScanPicture({ src, alt, width, height, turns }: ScanPictureProps) {
  const isAcross = turns % 2 === 1;
  return createElement(
    'div',
    { style: { width, height, position: 'relative', overflow: 'hidden', borderRadius: 2, boxShadow: '0 1px 3px rgba(10, 20, 30, 0.18)', flexShrink: 0 } },
    createElement('img', {
      src,
      alt,
      decoding: 'sync',
      draggable: false,
      style: {
        position: 'absolute',
        left: '50%',
        top: '50%',
        width: isAcross ? height : width,
        height: isAcross ? width : height,
        transform: `translate(-50%, -50%) rotate(${turns * 90}deg)`,
      },
    }),
  );
}
