import { View } from 'react-native';
import type { PagePlaceView } from '../../contracts/scans';
import { Button } from '../../ui/button';
import { ChoiceRows } from '../../ui/choice-row';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { choosePlace, lacking } from './choose-place';
import { words } from './words';

const offered = 6;

interface PlaceFormProps {
  readonly places: readonly PagePlaceView[];
  readonly likely: string | null;
  readonly number: string;
  readonly pageNo: string;
  readonly onNumber: (number: string) => void;
  readonly onPage: (pageNo: string) => void;
  readonly onGo: () => void;
  readonly onTakeOut: (place: PagePlaceView) => void;
}

/** Whose page it is: typed, or chosen among the scripts that lack one. */
export function PlaceForm({ places, likely, number, pageNo, onNumber, onPage, onGo, onTakeOut }: PlaceFormProps) {
  const chosen = choosePlace(places, number, pageNo);
  const lack = lacking(places, pageNo);
  const inOf = (candidateId: string): number[] => places.filter((place) => place.candidateId === candidateId && place.image !== null).map((place) => place.pageNo);
  const place = 'place' in chosen ? chosen.place : null;
  const error = chosen.kind === 'unknown' ? words.unknown(number.trim()) : chosen.kind === 'no-such-page' ? words.noSuchPage(pageNo.trim()) : undefined;
  return (
    <View style={{ gap: 14 }}>
      <View style={{ flexDirection: 'row', gap: 10 }}>
        <View style={{ flex: 1 }}>
          <Vessel label={words.candidate} value={number} onChange={onNumber} variant="readingM" error={error} maxLength={40} isFocusedFirst onSubmit={onGo} testID="page-candidate" />
        </View>
        <View style={{ width: 92 }}>
          <Vessel label={words.page} value={pageNo} onChange={onPage} variant="readingM" keyboard="numeric" maxLength={2} onSubmit={onGo} testID="page-number" />
        </View>
      </View>
      {place && chosen.kind === 'free' ? (
        <Text variant="small" tone="ink2" live="polite">
          {words.free(place.candidateNumber, place.pageNo)}
        </Text>
      ) : null}
      {place && chosen.kind === 'taken' ? (
        <View style={{ gap: 8, alignItems: 'flex-start' }}>
          <Text variant="small" tone="iodine" weight={600} live="polite">
            {words.taken(place.candidateNumber, place.pageNo)}
          </Text>
          <Button isSmall onPress={() => onTakeOut(place)}>
            {words.takeOut}
          </Button>
        </View>
      ) : null}
      {lack.length > 0 ? (
        <View style={{ gap: 8 }}>
          <View>
            <Text variant="head" level={2}>
              {words.byHand}
            </Text>
            <Text variant="small" tone="ink2">
              {words.lack(Number(pageNo), lack.length)}
            </Text>
          </View>
          <ChoiceRows
            label={words.byHand}
            isLabelHidden
            chosen={place?.candidateId ?? null}
            onChoose={(id) => onNumber(places.find(({ candidateId }) => candidateId === id)?.candidateNumber ?? '')}
            choices={lack.slice(0, offered).map(({ candidateId, candidateNumber }) => ({
              value: candidateId,
              label: <Text variant="reading">{candidateNumber}</Text>,
              spoken: candidateNumber,
              note: candidateId === likely ? words.likely : words.others(inOf(candidateId)),
            }))}
          />
          {lack.length > offered ? (
            <Text variant="small" tone="ink2">
              {words.more(lack.length - offered)}
            </Text>
          ) : null}
        </View>
      ) : null}
    </View>
  );
}
