import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { LinkedVessels } from '../../ui/linked-vessels';
import { Text } from '../../ui/text';
import { ChemText } from '../chem-text';
import { chainOf, numbersFollowed } from './chain-of';
import { quantityShort } from './item-names';
import { words } from './words';

interface ChainProps {
  readonly items: readonly ItemView[];
  readonly itemId: string;
  readonly onChoose: (id: string) => void;
}

const w = words.follow;

/** A species and its electron stay on one line. */
const unbroken = (label: string): string => label.replace(/ (?=[1-7][spdf]\b)/g, '\u00a0');

/** The whole chain of items that one belongs to; nothing where it belongs to none. */
export function Chain({ items, itemId, onChoose }: ChainProps) {
  const chain = chainOf(items, itemId);
  if (chain.links.length === 0) return null;
  const placeOf = (id: string): number => chain.items.findIndex((item) => item.id === id);
  const isBroken = (id: string): boolean => chain.items.find((item) => item.id === id)?.worked.problems.some(({ path }) => path.startsWith('followThrough')) ?? false;
  const isAnyShut = chain.links.some(({ to, isTrivial }) => isTrivial || isBroken(to));
  return (
    <View style={{ gap: 4 }} testID="chain">
      <LinkedVessels
        label={w.chain}
        vessels={chain.items.map((item) => {
          const follows = numbersFollowed(items, item);
          return {
            id: item.id,
            number: item.number,
            label: <ChemText beside="small">{unbroken(item.worked.label)}</ChemText>,
            below: <ChemText beside="micro">{quantityShort(item.draft)}</ChemText>,
            spokenBefore: w.item,
            spokenAfter: follows.length === 0 ? '' : w.followsShort(follows),
            isHere: item.id === itemId,
          };
        })}
        links={chain.links.map(({ from, to, isTrivial }) => ({ from: placeOf(from), to: placeOf(to), isShut: isTrivial, isBroken: isBroken(to) }))}
        onChoose={onChoose}
      />
      <Text variant="micro" tone="ink3">
        {isAnyShut ? `${w.chainPress} ${w.chainShut}` : w.chainPress}
      </Text>
    </View>
  );
}
