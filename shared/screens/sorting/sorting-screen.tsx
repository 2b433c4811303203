import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { ApiError } from '../../client/api';
import { useLoosePages, useSortPage } from '../../client/scans';
import { useSitting } from '../../client/sittings';
import type { LoosePage, PageImageView, PagePlaceView } from '../../contracts/scans';
import { Button, ButtonLink } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { IconButton, IconLink } from '../../ui/icon-button';
import { Empty } from '../../ui/page-state';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useToast } from '../../ui/toast';
import { useIsWide } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { choosePlace, startOf } from './choose-place';
import { PageOnMat } from '../page-on-mat';
import { PlaceForm } from './place-form';
import { words } from './words';

/** Gives pages that name no script to their script. */
export function SortingScreen({ sittingId }: { sittingId: string }) {
  const loose = useLoosePages(sittingId);
  const sitting = useSitting(sittingId);
  const [at, setAt] = useState(0);
  const canSort = sitting.data?.roles.some((role) => role === 'lead' || role === 'reader') ?? false;
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={loose} fetching="Fetching the loose pages" failed="The loose pages did not come.">
        {({ pages, places }) => {
          const index = Math.min(at, pages.length - 1);
          const page = pages[index];
          return page ? (
            <Sorting key={`${page.id}-${page.rev}`} sittingId={sittingId} page={page} places={places} index={index} count={pages.length} onGo={setAt} canSort={canSort} isLead={sitting.data?.roles.includes('lead') ?? false} />
          ) : (
            <Empty head={words.none} action={<ButtonLink href={`/sittings/${sittingId}/scans`}>{words.toTray}</ButtonLink>}>
              {words.noneText}
            </Empty>
          );
        }}
      </QueryState>
    </InSitting>
  );
}

interface SortingProps {
  readonly sittingId: string;
  readonly page: LoosePage;
  readonly places: readonly PagePlaceView[];
  readonly index: number;
  readonly count: number;
  readonly onGo: (index: number) => void;
  readonly canSort: boolean;
  readonly isLead: boolean;
}

function Sorting({ sittingId, page, places, index, count, onGo, canSort, isLead }: SortingProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const toast = useToast();
  const sort = useSortPage(sittingId);
  const start = startOf(page, places);
  const [number, setNumber] = useState(start.number);
  const [pageNo, setPageNo] = useState(start.pageNo);
  const [isWhole, setWhole] = useState(isWide);
  const [readings, setReadings] = useState<{ place: PagePlaceView; message: string } | null>(null);
  const chosen = choosePlace(places, number, pageNo);
  const free = chosen.kind === 'free' ? chosen.place : null;
  const taken = chosen.kind === 'taken' ? chosen.place : null;
  const candidateId = 'place' in chosen ? chosen.place.candidateId : null;
  const others = places.filter((place) => place.candidateId === candidateId && place.image !== null);

  const backAgain = (image: PageImageView, text: string) =>
    toast({ text, icon: 'check', action: { label: words.takeBack, onPress: () => sort.mutate({ pageId: image.id, rev: image.rev, act: 'loosen', body: { reopen: false } }) } });
  const place = () => {
    if (!free) return;
    sort.mutate({ pageId: page.id, rev: page.rev, act: 'place', body: { candidateId: free.candidateId, pageNo: free.pageNo } }, { onSuccess: (image) => backAgain(image, words.placed(free.candidateNumber, free.pageNo)) });
  };
  const discard = () => sort.mutate({ pageId: page.id, rev: page.rev, act: 'discard' }, { onSuccess: (image) => backAgain(image, words.discarded(page.fileName)) });
  const takeOut = (other: PagePlaceView, reopen: boolean) => {
    if (!other.image) return;
    sort.mutate(
      { pageId: other.image.id, rev: other.image.rev, act: 'loosen', body: { reopen } },
      {
        onSuccess: () => setReadings(null),
        onError: (error) => {
          if (isLead && !reopen && error instanceof ApiError && error.code === 'conflict') setReadings({ place: other, message: error.message });
        },
      },
    );
  };

  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <View style={{ minHeight: 56, flexDirection: 'row', alignItems: 'center', paddingHorizontal: isWide ? 12 : 4, borderBottomWidth: 1, borderColor: colors.hair }}>
        <IconLink icon="back" label={words.back} href={`/sittings/${sittingId}/scans`} />
        <View style={{ flex: 1 }}>
          <Text variant="head" level={1}>
            {words.title}
          </Text>
          <Text variant="small" tone="ink2">
            {words.place(index + 1, count, page.bundle)}
          </Text>
        </View>
        <IconButton icon="up" label={words.previous} isDisabled={index === 0} onPress={() => onGo(index - 1)} />
        <IconButton icon="down" label={words.next} isDisabled={index + 1 >= count} onPress={() => onGo(index + 1)} />
      </View>
      <View style={{ flex: 1, minHeight: 0, flexDirection: isWide ? 'row' : 'column' }}>
        <View style={{ flex: 1, minHeight: 0, flexBasis: 0 }}>
          <View style={{ flex: 1, minHeight: 0, flexDirection: 'row', gap: 2 }}>
            <PageOnMat id={page.id} rev={page.rev} label={words.picture(page.fileName)} isWhole={isWhole} />
            {taken?.image ? <PageOnMat id={taken.image.id} rev={taken.image.rev} label={words.picture(`${taken.candidateNumber}, page ${taken.pageNo}`)} isWhole={isWhole} /> : null}
          </View>
          <View style={{ minHeight: 48, flexDirection: 'row', alignItems: 'center', paddingHorizontal: 16, gap: 4, backgroundColor: colors.mat }}>
            <View style={{ flex: 1 }}>
              <Text variant="small" weight={500} lines={2}>
                {page.fileName}: {page.why}
              </Text>
            </View>
            {canSort ? <IconButton icon="turn" label={words.turn} onPress={() => sort.mutate({ pageId: page.id, rev: page.rev, act: 'turn', body: { by: 1 } })} /> : null}
            <IconButton icon={isWhole ? 'closer' : 'page'} label={isWhole ? words.whole : words.fit} onPress={() => setWhole(!isWhole)} />
          </View>
        </View>
        <View style={isWide ? { width: 412, borderLeftWidth: 1, borderColor: colors.hair } : { maxHeight: '56%', borderTopWidth: 1, borderColor: colors.hair }}>
          <ScrollView contentContainerStyle={{ padding: 16, gap: 16 }}>
            {canSort ? (
              <PlaceForm places={places} likely={page.likely?.candidateId ?? null} number={number} pageNo={pageNo} onNumber={setNumber} onPage={setPageNo} onGo={place} onTakeOut={(other) => takeOut(other, false)} />
            ) : (
              <Text>{words.viewOnly}</Text>
            )}
            {sort.error ? (
              <Text tone="methyl" live="assertive">
                {sort.error.message}
              </Text>
            ) : null}
            {isWide && !taken && others.length > 0 ? (
              <View style={{ gap: 8 }}>
                <Text variant="label">{words.compare(others[0]?.candidateNumber ?? '')}</Text>
                {others.map(({ image, pageNo: otherNo }) =>
                  image ? (
                    <View key={image.id} style={{ height: 460 }}>
                      <PageOnMat id={image.id} rev={image.rev} label={words.picture(`page ${otherNo}`)} isWhole />
                    </View>
                  ) : null,
                )}
              </View>
            ) : null}
          </ScrollView>
          {canSort ? (
            <View style={{ flexDirection: 'row', gap: 10, padding: 12, borderTopWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
              <View style={{ flex: 1 }}>
                <Button isWide onPress={discard} isBusy={sort.isPending} testID="discard-page">
                  {words.discard}
                </Button>
              </View>
              <View style={{ flex: 1 }}>
                <Button kind="primary" isWide onPress={place} isBusy={sort.isPending} closed={free ? undefined : ''} testID="place-page">
                  {free ? words.itIs(free.candidateNumber) : words.itIsOpen}
                </Button>
              </View>
            </View>
          ) : null}
        </View>
      </View>
      {readings ? (
        <Dialog
          title={words.takeOut}
          onClose={() => setReadings(null)}
          actions={
            <>
              <Button kind="primary" isBusy={sort.isPending} onPress={() => takeOut(readings.place, true)}>
                {words.reopen}
              </Button>
              <Button onPress={() => setReadings(null)}>{words.keep}</Button>
            </>
          }
        >
          <Text>{readings.message}</Text>
        </Dialog>
      ) : null}
    </View>
  );
}
