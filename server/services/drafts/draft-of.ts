import { exactDecimals, fromFractionText, toDecimals, toFractionText } from '../../../shared/chemistry/exact';
import { askedConventions, askedQuantities, type ElectronDraft, type ItemDraft, type PrintedDraft } from '../../../shared/contracts/items';
import { completeScheme } from '../../../shared/marking/complete-scheme';
import { marksText } from '../../../shared/marking/grains';
import type { AskedElectron, Band, CompleteScheme, ItemScheme } from '../../../shared/marking/scheme';
import { proposedPrompt } from './asked-of';
import { inPercent } from './read-parts';

/** As it could be typed again: a width that no decimal says stays a fraction, so that storing it anew changes nothing. */
function widthText({ kind, width }: Band, decimals: number): string {
  const value = kind === 'relative' ? inPercent(fromFractionText(width)) : fromFractionText(width);
  const places = exactDecimals(value);
  return places === null ? toFractionText(value) : toDecimals(value, Math.max(places, kind === 'absolute' ? decimals : 0));
}

const electronDraft = ({ symbol, charge, electron, configuration }: AskedElectron): ElectronDraft => ({ symbol, charge, electron, ...(configuration === undefined ? {} : { configuration }) });

function askedDraft({ asked, key, units }: CompleteScheme): ItemDraft['asked'] {
  const convention = askedConventions.find((name) => name === asked.convention);
  const quantity = askedQuantities.find((name) => name === asked.quantity);
  if (quantity === undefined || convention === undefined) throw new Error(`The editor has no fields for ${asked.quantity} under ${asked.convention}.`);
  return {
    ...electronDraft(asked),
    quantity,
    convention,
    ...(asked.radiusAngstrom === undefined ? {} : { radiusAngstrom: asked.radiusAngstrom }),
    ...(asked.countsItself === undefined ? {} : { countsItself: asked.countsItself }),
    ...(asked.other ? { other: electronDraft(asked.other) } : {}),
    ...(asked.typed ? { typed: { ...asked.typed, value: key.text, unit: units[0] ?? '' } } : {}),
  };
}

const printedDraft = ({ printed }: CompleteScheme): PrintedDraft | null =>
  printed && {
    question: printed.question,
    options: printed.options.map(electronDraft),
    partMarks: printed.partMarks.map(({ inPlace, grains }) => ({ inPlace, marks: marksText(grains) })),
  };

/** A stored scheme as the editor's draft; the wording is null where it is the proposed one. */
export function draftOf(stored: ItemScheme, prompt: string): ItemDraft {
  const scheme = completeScheme(stored);
  const { decimals, figures } = stored.key;
  const { downToDecimals, downToFigures, truncation } = scheme.roundings;
  const link = scheme.followThrough;
  return {
    kind: scheme.kind,
    asked: askedDraft(scheme),
    printed: printedDraft(scheme),
    decimals: Math.min(4, decimals),
    figures: figures ?? 4,
    prompt: prompt === proposedPrompt(scheme) ? null : prompt,
    marks: marksText(scheme.maxGrains),
    roundings: { downToDecimals, truncation, ...(downToFigures === undefined ? {} : { downToFigures }) },
    bands: scheme.bands.map((band) => ({ name: band.name, kind: band.kind, width: widthText(band, decimals), marks: marksText(band.grains) })),
    alternatives: scheme.alternatives.map(({ name, convention = null, text, grains, reason }) => ({ name, convention: convention === 'typed' ? null : convention, value: convention === null ? text : '', marks: marksText(grains), reason })),
    slips: scheme.slips.map(({ id, grains }) => ({ id, marks: marksText(grains) })),
    followThrough: link && { from: link.from, second: link.second?.from ?? null, isTrivial: link.isTrivial },
    methodMarks: scheme.methodMarks.map(({ id, text, grains }) => ({ id, text, marks: marksText(grains) })),
    unitCost: scheme.unitRule && marksText(scheme.unitRule.grains),
    signCost: scheme.signRule && marksText(scheme.signRule.grains),
    crossedOut: scheme.crossedOut,
    twoAnswers: scheme.twoAnswers,
  };
}
