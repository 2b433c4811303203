/** What one file may hold. Each limit is met before the bytes behind it are decoded. */
export const mostEntries = 2_000;
export const mostPages = 2_000;
/** One picture, or one file inside an archive. */
export const mostPictureBytes = 128 * 1024 * 1024;
/** A PDF is held whole in memory while it is opened. */
export const mostPdfBytes = 192 * 1024 * 1024;
/** All an archive unpacks to. */
export const mostUnpackedBytes = 4 * 1024 * 1024 * 1024;
/** Scans hardly shrink in an archive; a blank page without compression shrinks some hundredfold. */
export const mostRatio = 100;
/** Below this nobody asks about the ratio. */
export const ratioFromBytes = 64 * 1024 * 1024;
/** A page of a PDF is at most 100 inches long. */
export const longestPagePt = 7_200;
/** Pixels of a page drawn from a PDF; A3 at 200 dpi has 7.7 million. */
export const mostDrawnPixels = 16_000_000;
export const drawnDpi = 200;
export const longestOpeningMs = 60_000;

export const inMegabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024).toLocaleString('en-GB')} MB`;
