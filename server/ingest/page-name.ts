export interface NamedPage {
  readonly number: string;
  readonly pageNo: number;
}

const pattern = /^(.+?)[-_ ]p(\d{1,2})\.[a-z0-9]{2,5}$/i;

/** Candidate and page that a file name gives, as `W4071-p1.jpg`, `W4071_p1.png` or `W4071 p1.tif`; null for any other name. */
export function pageFromName(fileName: string): NamedPage | null {
  const match = pattern.exec(fileName.trim());
  if (!match) return null;
  const pageNo = Number(match[2]);
  return pageNo === 0 ? null : { number: (match[1] ?? '').trim(), pageNo };
}
