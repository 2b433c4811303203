import type { LoosePage, PagePlaceView } from '../../contracts/scans';

export type Chosen =
  | { readonly kind: 'nothing' }
  | { readonly kind: 'unknown' | 'no-such-page' }
  | { readonly kind: 'free' | 'taken'; readonly place: PagePlaceView };

/** What a typed number and page come to; the number without regard to case. */
export function choosePlace(places: readonly PagePlaceView[], number: string, pageNo: string): Chosen {
  const wanted = number.trim().toLowerCase();
  if (wanted === '') return { kind: 'nothing' };
  const mine = places.filter((place) => place.candidateNumber.toLowerCase() === wanted);
  if (mine.length === 0) return { kind: 'unknown' };
  const place = mine.find((one) => String(one.pageNo) === pageNo.trim());
  if (!place) return { kind: 'no-such-page' };
  return { kind: place.image === null ? 'free' : 'taken', place };
}

/** Scripts that lack a page, those first that another page of is here already, then in the order of the class list. */
export function lacking(places: readonly PagePlaceView[], pageNo: string): PagePlaceView[] {
  const hasOther = new Set(places.filter(({ image }) => image !== null).map(({ candidateId }) => candidateId));
  const empty = places.filter((place) => place.image === null && String(place.pageNo) === pageNo.trim());
  return [...empty.filter(({ candidateId }) => hasOther.has(candidateId)), ...empty.filter(({ candidateId }) => !hasOther.has(candidateId))];
}

/** Where the form starts for a page: the place its file name speaks for, else the first page that someone lacks. */
export function startOf(page: LoosePage, places: readonly PagePlaceView[]): { number: string; pageNo: string } {
  const likely = page.likely && places.find(({ candidateId, pageNo }) => candidateId === page.likely?.candidateId && pageNo === page.likely.pageNo);
  const first = places.find(({ image }) => image === null);
  return { number: likely?.candidateNumber ?? '', pageNo: String(likely?.pageNo ?? first?.pageNo ?? 1) };
}
