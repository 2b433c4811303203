import { Image, View } from 'react-native';
import { pagePictureUrl } from '../../client/pictures';
import { filesShown } from '../../contracts/enums';
import type { BatchView } from '../../contracts/scans';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { words } from './words';

/** The pages of one bundle as small pictures with their places, those that need someone first. */
export function ContactSheet({ batch }: { batch: BatchView }) {
  const colors = useColors();
  const pages = batch.uploads.flatMap(({ pages: made, fileName }) => made.map((page) => ({ ...page, fileName: page.name ?? (made.length > 1 ? words.sheet.page(fileName, page.index + 1) : fileName) }))).filter(({ state }) => state !== 'refused');
  return (
    <View style={{ gap: 12, padding: 16 }}>
      <Text variant="head" level={2}>
        {words.sheet.title(batch.bundle)}
      </Text>
      {pages.length === 0 ? <Text tone="ink2">{words.sheet.none}</Text> : null}
      {batch.uploads.length === filesShown ? (
        <Text variant="small" tone="ink2">
          {words.sheet.first(filesShown)}
        </Text>
      ) : null}
      <View role="list" aria-label={words.sheet.title(batch.bundle)} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 14 }}>
        {pages.map((page) => {
          const caption = page.place ?? (page.state === 'discarded' ? words.sheet.discarded : words.sheet.loose);
          return (
            <View key={page.id} role="listitem" style={{ width: 112, gap: 4 }}>
              <View style={{ backgroundColor: colors.mat, padding: 6, borderRadius: 2 }}>
                <Image
                  source={{ uri: pagePictureUrl(page.id, 'thumb') }}
                  accessibilityLabel={words.sheet.picture(page.place ?? page.fileName)}
                  resizeMode="contain"
                  style={{ width: 100, height: 141, backgroundColor: colors.well }}
                />
              </View>
              <Text variant="micro" tone={page.place === null ? 'iodine' : 'ink2'} lines={2}>
                {page.place === null ? `${caption}: ${page.fileName}` : caption}
              </Text>
            </View>
          );
        })}
      </View>
    </View>
  );
}
