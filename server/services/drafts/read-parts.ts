import { divide, multiply, toFractionText, whole, type Exact } from '../../../shared/chemistry/exact';
import { slipLetter } from '../../../shared/chemistry/slips/letters';
import { slipsOf } from '../../../shared/chemistry/slips/slips-of';
import { work } from '../../../shared/chemistry/work';
import type { AlternativeDraft, BandDraft, ItemDraft, ItemProblem } from '../../../shared/contracts/items';
import { readAnswer } from '../../../shared/marking/read-answer';
import { readPrintedNumbers } from '../../../shared/marking/printed-numbers';
import type { Alternative, Asked, Band, MethodMark, NamedSlip, PartMark, Penalty } from '../../../shared/marking/scheme';
import { readMarks } from '../../../shared/marking/typed-marks';

/** Reads the parts of one draft, and keeps what is wrong with each field. */
export interface PartsReader {
  readonly refusals: ItemProblem[];
  refuse(path: string, message: string): null;
}

export function partsReader(): PartsReader {
  const refusals: ItemProblem[] = [];
  return {
    refusals,
    refuse: (path, message) => {
      refusals.push({ path, message });
      return null;
    },
  };
}

export const percent = whole(100);

function readWidth({ kind, width }: BandDraft): Exact | string {
  const read = readAnswer(width.trim(), []);
  if (!read.ok) return read.unfinished ? 'Write a width.' : read.message;
  return kind === 'relative' ? divide(read.value, percent) : read.value;
}

function marksAt(reader: PartsReader, path: string, typed: string, mayBeNone = false): number | null {
  const marks = readMarks(typed, mayBeNone);
  return marks.ok ? marks.grains : reader.refuse(path, marks.message);
}

export function readBand(reader: PartsReader, band: BandDraft, index: number): Band | null {
  if (band.name.trim() === '') reader.refuse(`bands.${index}.name`, 'Name the band.');
  const width = readWidth(band);
  if (typeof width === 'string') reader.refuse(`bands.${index}.width`, width);
  const grains = marksAt(reader, `bands.${index}.marks`, band.marks);
  if (typeof width === 'string' || grains === null) return null;
  return { name: band.name, kind: band.kind, width: toFractionText(width), grains };
}

type Added = Pick<Alternative, 'value' | 'text' | 'decimals' | 'figures' | 'convention'>;

function byConvention(reader: PartsReader, convention: NonNullable<AlternativeDraft['convention']>, asked: Asked, path: string): Added | null {
  const worked = work({ ...asked, convention });
  if (!worked.ok) return reader.refuse(`${path}.convention`, worked.problem.message);
  const { value, text, decimals, figures } = worked.value;
  return { convention, value: toFractionText(value), text, decimals, ...(figures === null ? {} : { figures }) };
}

function byHand(reader: PartsReader, draft: AlternativeDraft, isPrinted: boolean, path: string): Added | null {
  if (draft.reason.trim() === '') reader.refuse(`${path}.reason`, 'Say why this value is accepted.');
  const read = isPrinted ? readPrintedNumbers(draft.value) : readAnswer(draft.value.trim(), []);
  if (!read.ok) return reader.refuse(`${path}.value`, read.unfinished ? 'Write a value.' : read.message);
  return { value: toFractionText(read.value), text: isPrinted ? read.canonical : draft.value.trim(), decimals: read.decimals };
}

export function readAlternative(reader: PartsReader, draft: AlternativeDraft, index: number, asked: Asked, isPrinted: boolean): Alternative | null {
  const path = `alternatives.${index}`;
  if (draft.name.trim() === '') reader.refuse(`${path}.name`, 'Name the alternative.');
  const grains = marksAt(reader, `${path}.marks`, draft.marks);
  const added = draft.convention === null ? byHand(reader, draft, isPrinted, path) : byConvention(reader, draft.convention, asked, path);
  return grains === null || added === null ? null : { name: draft.name, grains, reason: draft.reason, ...added };
}

export function readSlip(reader: PartsReader, draft: ItemDraft['slips'][number], index: number, asked: Asked): NamedSlip | null {
  const slip = slipsOf(asked).find(({ id }) => id === draft.id);
  const grains = marksAt(reader, `slips.${index}.marks`, draft.marks, true);
  if (!slip) return reader.refuse(`slips.${index}.id`, 'This slip cannot be made on this item.');
  if (slip.isSilent) return reader.refuse(`slips.${index}.id`, `The slip “${slip.name}” gives the right number here: this item cannot see it.`);
  const { id, name, value, text, figures, feedback } = slip;
  return grains === null ? null : { id, letter: slipLetter(id), name, value: toFractionText(value), text, ...(figures === null ? {} : { figures }), grains, feedback };
}

export function readMethodMark(reader: PartsReader, { id, text, marks }: ItemDraft['methodMarks'][number], index: number): MethodMark | null {
  if (text === '') reader.refuse(`methodMarks.${index}.text`, 'Say what the working must show.');
  if (id.includes(',')) reader.refuse(`methodMarks.${index}.id`, 'An id has no comma.');
  const grains = marksAt(reader, `methodMarks.${index}.marks`, marks);
  return grains === null ? null : { id, text, grains };
}

export function readPartMark(reader: PartsReader, { inPlace, marks }: { inPlace: number; marks: string }, index: number): PartMark | null {
  const grains = marksAt(reader, `printed.partMarks.${index}.marks`, marks);
  return grains === null ? null : { inPlace, grains };
}

export function readPenalty(reader: PartsReader, path: 'unitCost' | 'signCost', typed: string | null): Penalty | null {
  if (typed === null) return null;
  const grains = marksAt(reader, path, typed);
  return grains === null ? null : { grains };
}

/** A share as it could be typed again. */
export const inPercent = (share: Exact): Exact => multiply(share, percent);
