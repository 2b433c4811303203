const versionLength = 16;

/** What an address of a picture carries of its hash, so that it never shows another. */
export const pictureVersion = (sha256: string): string => sha256.slice(0, versionLength);
