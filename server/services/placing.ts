import { placeById, placesOfNumber, type PagePlace } from '../../db/queries/page-images';
import { scriptPage, sittingByPrintNumber } from '../../db/queries/sheets';
import { findSitting } from '../../db/queries/sittings';
import type { PageIdentity } from '../../shared/sheets/identity';
import type { Context } from '../context';
import { pageFromName } from '../ingest/page-name';
import type { SheetReport } from '../ingest/sheet/sheet-task';

/** A page on its way to its place: what is known of it before a person looks. */
export interface PageToPlace {
  readonly sittingId: string;
  /** Name of the file that holds it, without folders. */
  readonly fileName: string;
  /** Which page of that file, counted from 0, and of how many. */
  readonly frame: number;
  readonly of: number;
  /** What its printed codes say; null where they were not looked for, or not yet. */
  readonly sheet: SheetReport | null;
}

export type Placing = { readonly place: PagePlace; readonly from: 'codes' | 'file name' } | { readonly why: string };

const attendanceWords: Readonly<Record<string, string>> = { absent: 'absent', withdrawn: 'withdrawn', deferred: 'deferred' };

function taken(place: PagePlace, from: 'codes' | 'file name'): Placing {
  const away = attendanceWords[place.attendance];
  if (away !== undefined) return { why: `The class list says that ${place.candidateNumber} is ${away}.` };
  if (place.image !== null) return { why: `Page ${place.pageNo} of ${place.candidateNumber} is in already.` };
  return { place, from };
}

function placeAmong(places: readonly PagePlace[], pageNo: number): Placing {
  const place = places.find((one) => one.pageNo === pageNo);
  return place ? taken(place, 'file name') : { why: `The paper has no page ${pageNo}.` };
}

const stemOf = (fileName: string): string => fileName.replace(/\.[a-z0-9]{2,5}$/i, '').trim();

/** The place that a file name gives: of candidate and page, or of a candidate whose whole script the file is. */
function placeByName({ db }: Pick<Context, 'db'>, { sittingId, fileName, frame, of }: PageToPlace): Placing {
  const named = of === 1 ? pageFromName(fileName) : null;
  if (named) {
    const places = placesOfNumber(db, sittingId, named.number);
    return places.length === 0 ? { why: `Nobody on the class list has the number ${named.number}.` } : placeAmong(places, named.pageNo);
  }
  if (of === 1) return { why: 'The file name gives no candidate and page.' };
  const places = placesOfNumber(db, sittingId, stemOf(fileName));
  return places.length === of ? placeAmong(places, frame + 1) : { why: `The file holds ${of} pages. Say whose each is.` };
}

/** A sitting of the same course is named; of any other only its printed number is told. */
function otherSitting({ db }: Pick<Context, 'db'>, sittingId: string, printNumber: number): string {
  const other = sittingByPrintNumber(db, printNumber);
  const isOurs = other && other.course === findSitting(db, sittingId)?.course;
  return isOurs ? `This sheet belongs to another sitting: ${other.title}. Bring it in there.` : `This sheet belongs to another sitting, number ${printNumber}.`;
}

function placeByCodes(context: Pick<Context, 'db'>, sittingId: string, { sitting, script, page, layout }: PageIdentity): Placing {
  const { db } = context;
  if (sitting !== findSitting(db, sittingId)?.printNumber) return { why: otherSitting(context, sittingId, sitting) };
  const found = scriptPage(db, sittingId, script, page);
  if (!found) return { why: `This sheet says script ${script}, which this sitting does not have.` };
  if (found.voidReason !== null || found.mergedInto !== null) return { why: `Script ${script} does not count any more.` };
  if (found.candidateNumber === null) return { why: `This is page ${page} of spare script ${script}, which has no candidate yet. Say whose it is.` };
  if (found.layout !== layout) return { why: `This is page ${page} of ${found.candidateNumber}, on a sheet of layout ${layout}; the script has layout ${found.layout ?? 'none'}. Look at it before it is placed.` };
  const place = found.page === null ? undefined : placeById(db, found.page);
  return place ? taken(place, 'codes') : { why: `Script ${script} has no page ${page}.` };
}

const whyNotPlaced: Readonly<Record<string, string>> = {
  'unknown-layout': 'Its codes name a sheet that was not printed from here.',
  'codes-disagree': 'Its codes do not lie as on a sheet: it may be folded or two pictures in one. Scan it again.',
  'frames-not-found': 'Its codes were read, but its boxes were not found. Scan it flat.',
  'other-format': 'Its codes are of a sheet that this version does not know.',
  'wrong-check': 'Its codes are not of a sheet printed from here.',
  'several-sheets': 'Two sheets are in one picture. Scan them apart.',
};

/** The place of a page, or why it goes to sorting: what is printed on it first, then its file name. */
export function placeOf(context: Pick<Context, 'db'>, page: PageToPlace): Placing {
  const { sheet } = page;
  if (sheet?.state === 'read') return placeByCodes(context, page.sittingId, sheet.identity);
  if (sheet?.state === 'unplaced') {
    const byCodes = placeByCodes(context, page.sittingId, sheet.identity);
    return 'why' in byCodes ? byCodes : { why: `${whyNotPlaced[sheet.reason] ?? ''} It says page ${byCodes.place.pageNo} of ${byCodes.place.candidateNumber}.` };
  }
  const claim = sheet?.state === 'unidentified' ? whyNotPlaced[sheet.reason] : undefined;
  return claim === undefined ? placeByName(context, page) : { why: claim };
}
