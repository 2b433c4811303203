/** All that decides the mark of one item. Plain data: it is stored, named by the hash of its content, and never changed. */

/** The seven readings without a value. */
export const codes = [
  'blank',
  'cannot-read',
  'crossed-out',
  'two-answers',
  'elsewhere',
  'wrong-page',
  'ask-the-lead',
] as const;
export type Code = (typeof codes)[number];

export const conventions = [
  'slater',
  'slater-035-in-1s',
  'slater-d-at-1',
  'core-count',
  'scf',
  'ionisation-energy',
  'typed',
] as const;
export type ConventionName = (typeof conventions)[number];

export const quantities = [
  'zeff',
  'sigma',
  'difference',
  'energy-ev',
  'energy-kj-mol',
  'radius-pm',
  'electronegativity',
  'value',
] as const;
export type QuantityName = (typeof quantities)[number];

export interface AskedElectron {
  readonly symbol: string;
  readonly charge: number;
  readonly electron: string;
  readonly configuration?: string;
}

/** Species, electron, quantity and convention: what fixes the key of a computed item. */
export interface Asked {
  readonly symbol: string;
  readonly charge: number;
  /** Such as `3p`. */
  readonly electron: string;
  readonly quantity: QuantityName;
  readonly convention: ConventionName;
  /** Of a question whose key the lead types: what the item is called, and where the value is from. Its species and electron are empty. */
  readonly typed?: { readonly label: string; readonly source: string };
  /** For a difference of two: the electron that is taken off. */
  readonly other?: AskedElectron;
  /** For an electronegativity: the covalent radius in ångström as the question states it, and whether the electron counts itself. */
  readonly radiusAngstrom?: string;
  readonly countsItself?: boolean;
  /** A typed configuration, such as `1s2 2s2 2p5 3s1`, where the ground state is not meant. */
  readonly configuration?: string;
}

export interface Key {
  /** The exact value as a reduced fraction, `61/10`. */
  readonly value: string;
  /** As printed, `6.10`. */
  readonly text: string;
  /** The decimals an answer must show to meet the key itself; its trailing zeros are information. */
  readonly decimals: number;
  /** The significant figures of a key that is no short decimal, which roundings alone meet; absent for the others. */
  readonly figures?: number;
}

export interface RoundingPolicy {
  /** The fewest decimals still accepted; null when only the key's own decimals are. */
  readonly downToDecimals: number | null;
  /** The fewest significant figures still accepted, for a key that states its figures. */
  readonly downToFigures?: number | null;
  /** Whether cutting off the places counts like rounding them. */
  readonly truncation: boolean;
}

export type BandKind = 'absolute' | 'relative' | 'decimal-places' | 'significant-figures';

/** Closed at both ends, round the key only. Nested: the innermost that contains the value counts. */
export interface Band {
  readonly name: string;
  readonly kind: BandKind;
  /** absolute: half width, `1/20`; relative: share of |key|, `1/20` is 5 %; the other kinds: the count of places or figures. */
  readonly width: string;
  readonly grains: number;
}

/** Another value the lead accepts, with the same roundings as the key. */
export interface Alternative {
  readonly name: string;
  readonly value: string;
  readonly text: string;
  readonly decimals: number;
  /** The significant figures of a value that is no short decimal; absent for the others. */
  readonly figures?: number;
  readonly grains: number;
  readonly reason: string;
  readonly convention?: ConventionName;
}

/** A slip that the scheme names: its value on this item, and its share of the marks, 0 where it is named only. */
export interface NamedSlip {
  readonly id: string;
  /** The same on every paper. */
  readonly letter: string;
  readonly name: string;
  readonly value: string;
  readonly text: string;
  /** The significant figures of a value that is no short decimal; absent for the others. */
  readonly figures?: number;
  readonly grains: number;
  readonly feedback: string;
}

/**
 * What becomes of an answer that was crossed out, or of two left standing: ask a person, none, or the last one written; that
 * one has a value, so a person types it.
 */
export type AnswerPolicy = 'ask' | 'none' | 'last';

/** An earlier item whose settled value is carried on. */
export interface FollowedItem {
  readonly from: string;
  /** What that item asks for. */
  readonly quantity: QuantityName;
}

/** Error carried forward: the key worked again from the candidate's own settled value of an earlier item. */
export interface FollowThrough extends FollowedItem {
  /** A step too short to be worth a mark of its own is not followed. */
  readonly isTrivial: boolean;
  /** For a difference: where the electron that is taken off comes from; `from` is that of the first. */
  readonly second?: FollowedItem;
}

/** A yes or no beside the value, struck by the reader from the working shown. */
export interface MethodMark {
  readonly id: string;
  readonly text: string;
  readonly grains: number;
}

/** What a unit or a sign that went wrong costs, once per paper. */
export interface Penalty {
  readonly grains: number;
}

/** A faulty item: full marks for all, or out of the total. */
export type Withdrawn = 'none' | 'full' | 'drop';

export type PrintedQuestion = 'greatest' | 'least' | 'increasing' | 'decreasing';

/** A mark for an order that has at least so many numbers in their places, fewer than all of them. */
export interface PartMark {
  readonly inPlace: number;
  readonly grains: number;
}

/** Options as printed, numbered from 1, and the numbers that are right. */
export interface PrintedOptions {
  readonly question: PrintedQuestion;
  readonly options: readonly AskedElectron[];
  /** `3`, or `3 1 2`. */
  readonly answer: string;
  /** Of an order only. */
  readonly partMarks: readonly PartMark[];
}

/** `choice`: one printed number is right. `order`: the printed numbers, typed in their order as digits. */
export type ItemKind = 'numeric' | 'choice' | 'order';

/** Parts that came later are optional: a stored scheme stays as it was, and completeScheme says what an absent part means. */
export interface ItemScheme {
  readonly kind: ItemKind;
  readonly asked: Asked;
  /** The most the item gives, method marks included. */
  readonly maxGrains: number;
  readonly key: Key;
  /** The closed list of units an answer may carry, the unit of the key first; empty for a pure number. */
  readonly units: readonly string[];
  readonly unitRule?: Penalty | null;
  readonly signRule?: Penalty | null;
  readonly roundings: RoundingPolicy;
  readonly alternatives: readonly Alternative[];
  readonly bands: readonly Band[];
  readonly slips?: readonly NamedSlip[];
  readonly followThrough?: FollowThrough | null;
  readonly methodMarks?: readonly MethodMark[];
  /** The options of a choice or an order. */
  readonly printed?: PrintedOptions | null;
  readonly crossedOut: AnswerPolicy;
  readonly twoAnswers: AnswerPolicy;
  readonly withdrawn?: Withdrawn;
}

/** A scheme with every part said. */
export type CompleteScheme = Required<ItemScheme>;

/** What one person typed for one answer: the verbatim text or a code, never both. */
export type Given = { readonly text: string } | { readonly code: Code };

export const isCode = (given: Given): given is { readonly code: Code } => 'code' in given;

/** What else a verdict rests on besides the answer itself; empty for an item that follows from no other. See contextFor. */
export interface MarkingContext {
  /** The settled form of the item followed from, `@` for one without a value; absent while it is not settled. */
  readonly followed?: string;
  /** The same of the second electron of a difference. */
  readonly second?: string;
  /** A unit, or a sign, that an earlier item of the paper has paid for. */
  readonly unit?: 'charged';
  readonly sign?: 'charged';
  /** The ids of the method marks struck, in the order of the scheme, with commas. */
  readonly method?: string;
}

export const emptyContext: MarkingContext = {};

/** The rule that gave the mark, in the order in which a tie is settled; an item that is withdrawn has no other. */
export const rules = ['withdrawn', 'code', 'key', 'rounding', 'alternative', 'band', 'follow-through', 'part', 'slip', 'nothing'] as const;
export type RuleName = (typeof rules)[number];

/** The stored result of marking one distinct reading: grains null when a person has to decide. */
export interface Verdict {
  readonly grains: number | null;
  readonly rule: RuleName;
  /** The numbers behind the rule, such as { key: '6.10', decimals: '1' }; put into words when shown. */
  readonly numbers: Readonly<Record<string, string>>;
}
