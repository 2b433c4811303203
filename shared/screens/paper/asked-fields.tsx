import { View } from 'react-native';
import type { ElectronDraft, ItemDraft, WorkedDraft } from '../../contracts/items';
import { Checkbox } from '../../ui/checkbox';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { conventionsFor, isOrderQuestion, quantitiesFor, withConvention, withKind, withQuantity } from './draft-changes';
import { ElectronFields } from './electron-fields';
import { PrintedOptions } from './printed-options';
import { TypedKey } from './typed-key';
import { words } from './words';

export interface FieldsProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

const kinds = ['numeric', 'choice', 'order'] as const;
const questions = ['greatest', 'least', 'increasing', 'decreasing'] as const;
const decimals = ['0', '1', '2', '3', '4'] as const;
const figures = ['2', '3', '4', '5', '6'] as const;

const fits = (grow: number, basis: number) => ({ flexGrow: grow, flexBasis: basis });

/** What the item asks for: its kind, then what that kind needs. */
export function AskedFields(props: FieldsProps) {
  const { draft } = props;
  const isTyped = draft.kind === 'numeric' && draft.asked.convention === 'typed';
  return (
    <View style={{ gap: 12 }}>
      <Text variant="head" level={2}>
        {words.asked.title}
      </Text>
      <KindRow {...props} />
      <QuantityRow {...props} />
      {draft.kind !== 'numeric' ? <PrintedOptions {...props} /> : isTyped ? <TypedKey {...props} /> : <AskedElectrons {...props} />}
    </View>
  );
}

function KindRow({ draft, problemAt, onChange }: FieldsProps) {
  const { kind, printed } = draft;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
      <View style={fits(1, 100)}>
        <Select label={words.kind} value={kind} options={kinds.map((value) => ({ value, label: words.kinds[value] }))} onChange={(next) => onChange(withKind(draft, next), 'kind')} testID="kind" />
      </View>
      {printed && kind !== 'numeric' ? (
        <View style={fits(2, 150)}>
          <Select
            label={kind === 'order' ? words.ordering : words.question}
            value={printed.question}
            options={questions.filter((question) => isOrderQuestion(question) === (kind === 'order')).map((value) => ({ value, label: words.questions[value] }))}
            onChange={(question) => onChange({ ...draft, printed: { ...printed, question } }, 'question')}
            error={problemAt('printed.question')}
            testID="question"
          />
        </View>
      ) : null}
      <View style={fits(1, 76)}>
        <Vessel label={words.asked.marks} value={draft.marks} onChange={(marks) => onChange({ ...draft, marks }, 'marks')} error={problemAt('marks')} variant="reading" maxLength={16} testID="marks" />
      </View>
    </View>
  );
}

function QuantityRow({ draft, onChange }: FieldsProps) {
  const { kind, asked } = draft;
  const isTyped = asked.convention === 'typed' && kind === 'numeric';
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
      {isTyped ? null : (
        <View style={fits(1, 130)}>
          <Select label={words.asked.quantity} value={asked.quantity} options={quantitiesFor(kind).map((value) => ({ value, label: words.asked.quantities[value] }))} onChange={(quantity) => onChange(withQuantity(draft, quantity), 'quantity')} testID="quantity" />
        </View>
      )}
      <View style={fits(1, 130)}>
        <Select
          label={words.asked.convention}
          value={asked.convention}
          options={conventionsFor(kind, asked.quantity).map((value) => ({ value, label: words.asked.conventions[value] }))}
          onChange={(convention) => onChange(withConvention(draft, convention), 'convention')}
          help={isTyped ? words.conventionSource : undefined}
          testID="convention"
        />
      </View>
    </View>
  );
}

/** One electron, or two for a difference. */
function AskedElectrons(props: FieldsProps) {
  const { draft, problemAt, onChange } = props;
  const { asked } = draft;
  const put = (changes: Partial<ItemDraft['asked']>, field: string) => onChange({ ...draft, asked: { ...asked, ...changes } }, field);
  const { other } = asked;
  const isDifference = asked.quantity === 'difference' && other !== undefined;
  return (
    <View style={{ gap: 12 }}>
      <View role={isDifference ? 'group' : undefined} aria-label={isDifference ? words.first : undefined} style={{ gap: 6 }}>
        {isDifference ? <LegHead>{words.first}</LegHead> : null}
        <ElectronFields electron={asked} path="asked" problemAt={problemAt} onChange={put} besidePath="decimals" beside={(below) => <Precision {...props} refusedBy={below} />} />
      </View>
      {isDifference ? (
        <View role="group" aria-label={words.second} style={{ gap: 6 }}>
          <LegHead>{words.second}</LegHead>
          <ElectronFields electron={other} path="asked.other" problemAt={problemAt} onChange={(changes: Partial<ElectronDraft>, field) => put({ other: { ...other, ...changes } }, `other-${field}`)} testPrefix="second-" />
        </View>
      ) : null}
      {asked.quantity === 'electronegativity' ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: 10 }}>
          <View style={{ width: 110 }}>
            <Vessel label={words.asked.radius} value={asked.radiusAngstrom ?? ''} onChange={(radiusAngstrom) => put({ radiusAngstrom }, 'radius')} variant="reading" maxLength={12} testID="radius" />
          </View>
          <Checkbox isChecked={asked.countsItself ?? false} onChange={(countsItself) => put({ countsItself }, 'counts-itself')}>
            {words.asked.countsItself}
          </Checkbox>
        </View>
      ) : null}
    </View>
  );
}

function LegHead({ children }: { children: string }) {
  return (
    <Text variant="small" weight={600}>
      {children}
    </Text>
  );
}

/** How finely the answer is asked for: decimals, or figures where the key is no short decimal. */
function Precision({ draft, worked, problemAt, onChange, refusedBy }: FieldsProps & { readonly refusedBy: string }) {
  if (worked.key?.figures) {
    return <Select label={words.asked.figures} value={String(draft.figures)} options={figures.map((value) => ({ value, label: value }))} onChange={(value) => onChange({ ...draft, figures: Number(value) }, 'figures')} testID="figures" />;
  }
  return (
    <Select
      label={words.asked.decimals}
      value={String(draft.decimals)}
      options={decimals.map((value) => ({ value, label: value }))}
      onChange={(value) => onChange({ ...draft, decimals: Number(value) }, 'decimals')}
      refusedBy={problemAt('decimals') && refusedBy}
      testID="decimals"
    />
  );
}
