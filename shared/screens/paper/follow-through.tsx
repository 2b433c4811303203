import { View } from 'react-native';
import { electronLabel } from '../../marking/item-label';
import type { FollowDraft, ItemView } from '../../contracts/items';
import { plainChem } from '../chem-text-parts';
import { ChemText } from '../chem-text';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import type { FieldsProps } from './asked-fields';
import { Chain } from './chain';
import { chainOf } from './chain-of';
import { quantityShort } from './item-names';
import { RuleHead } from './rule-head';
import { words } from './words';

export interface ChainContext {
  /** The items of the paper, this one with its draft as it stands. */
  readonly items: readonly ItemView[];
  readonly itemId: string;
  readonly onChoose: (id: string) => void;
}

const w = words.follow;
const byRules = 'by-rules';

/** The link to earlier items whose own value is carried on; offered only where one can be, and the chain it makes. */
export function FollowThrough({ draft, worked, problemAt, onChange, ...context }: FieldsProps & ChainContext) {
  const { followThrough: link } = draft;
  const isLinked = chainOf(context.items, context.itemId).links.length > 0;
  if (draft.kind !== 'numeric' || (worked.sources.length === 0 && link === null && !isLinked)) return null;
  const put = (next: FollowDraft | null, field: string) => onChange({ ...draft, followThrough: next }, field);
  return (
    <View style={{ gap: 8, marginTop: 16 }} testID="follow-through">
      <RuleHead title={w.title} aside={w.aside} />
      {link ? <Link link={link} draft={draft} worked={worked} problemAt={problemAt} items={context.items} put={put} /> : <Offer draft={draft} worked={worked} items={context.items} put={put} />}
      <Chain {...context} />
    </View>
  );
}

interface PartProps extends Pick<FieldsProps, 'draft' | 'worked'>, Pick<ChainContext, 'items'> {
  readonly put: (link: FollowDraft | null, field: string) => void;
}

/** "item 3, Z_eff of Cl 3p", in letters that a picker can set. */
function nameOf(items: readonly ItemView[], id: string): string {
  const item = items.find((known) => known.id === id);
  return item ? plainChem(w.option(item.number, quantityShort(item.draft), item.worked.label)) : w.isGone;
}

function Offer({ draft, worked, items, put }: PartProps) {
  const first = worked.sources.filter(({ of }) => of === 'first');
  const second = worked.sources.filter(({ of }) => of === 'second');
  const nearest = first.at(-1);
  if (worked.sources.length === 0) return null;
  const named = (sources: typeof first) => sources.map(({ id, number, label }) => w.option(number, quantityShort(items.find((item) => item.id === id)?.draft ?? draft), label));
  if (!nearest) {
    return (
      <Text variant="small" tone="ink2">
        <ChemText beside="small">{w.onlySecond(second.map(({ number }) => String(number)), electronLabel(draft.asked))}</ChemText>
      </Text>
    );
  }
  return (
    <View style={{ gap: 4, alignItems: 'flex-start' }}>
      <Text tone="ink2">
        <ChemText>{w.offered(named([...first, ...second]))}</ChemText>
      </Text>
      <Button kind="text" isSmall icon="plus" onPress={() => put({ from: nearest.id, second: second.at(-1)?.id ?? null, isTrivial: false }, 'follow-added')} testID="add-follow">
        {w.add}
      </Button>
    </View>
  );
}

function Link({ link, draft, worked, problemAt, items, put }: PartProps & { readonly link: FollowDraft; readonly problemAt: FieldsProps['problemAt'] }) {
  const isDifference = draft.asked.quantity === 'difference' && draft.asked.other !== undefined;
  const legs = (of: 'first' | 'second', chosen: string | null) => {
    const known = worked.sources.filter((source) => source.of === of).map(({ id }) => ({ value: id, label: nameOf(items, id) }));
    return chosen === null || known.some(({ value }) => value === chosen) ? known : [...known, { value: chosen, label: w.notNow(nameOf(items, chosen)) }];
  };
  const seconds = legs('second', link.second);
  return (
    <View style={{ gap: 8 }}>
      <Select
        label={isDifference ? plainChem(w.fromFor(electronLabel(draft.asked))) : w.from}
        value={link.from}
        options={legs('first', link.from)}
        onChange={(from) => put({ ...link, from }, 'follow-from')}
        error={problemAt('followThrough.from')}
        height={40}
        testID="follow-from"
      />
      {isDifference && draft.asked.other && (seconds.length > 0 || link.second !== null) ? (
        <Select
          label={plainChem(w.second(electronLabel(draft.asked.other)))}
          value={link.second ?? byRules}
          options={[{ value: byRules, label: w.byRules }, ...seconds]}
          onChange={(second) => put({ ...link, second: second === byRules ? null : second }, 'follow-second')}
          error={problemAt('followThrough.second')}
          height={40}
          testID="follow-second"
        />
      ) : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-start', justifyContent: 'space-between', columnGap: 12 }}>
        <View style={{ flexShrink: 1 }}>
          <Checkbox isChecked={link.isTrivial} onChange={(isTrivial) => put({ ...link, isTrivial }, 'follow-trivial')} help={link.isTrivial ? w.isTrivialHelp : undefined} testID="follow-trivial">
            {w.isTrivial}
          </Checkbox>
        </View>
        <Button kind="text" isSmall icon="close" onPress={() => put(null, 'follow-removed')} testID="remove-follow">
          {w.remove}
        </Button>
      </View>
    </View>
  );
}
