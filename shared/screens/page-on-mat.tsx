import { useEffect, useState } from 'react';
import { Image, ScrollView, View } from 'react-native';
import { pagePictureUrl } from '../client/pictures';
import { useColors } from '../ui/theme';
import { radius, shadow } from '../ui/tokens';

interface PageOnMatProps {
  readonly id: string;
  readonly rev: number;
  readonly label: string;
  /** Fitted whole into its room, or as wide as the room and scrolled. */
  readonly isWhole: boolean;
}

const a4 = 297 / 210;

/** A page on its mat. It keeps its own paper in the dark theme. */
export function PageOnMat({ id, rev, label, isWhole }: PageOnMatProps) {
  const colors = useColors();
  const [room, setRoom] = useState({ width: 0, height: 0 });
  const [ratio, setRatio] = useState(a4);
  const uri = pagePictureUrl(id, 'display', rev);
  useEffect(() => {
    let isHere = true;
    Image.getSize(uri, (width, height) => {
      if (isHere && width > 0) setRatio(height / width);
    });
    return () => {
      isHere = false;
    };
  }, [uri]);
  const gap = 14;
  const widest = Math.max(0, room.width - 2 * gap);
  const width = isWhole ? Math.min(widest, Math.max(0, room.height - 2 * gap) / ratio) : widest;
  return (
    <View style={{ flex: 1, minHeight: 0, backgroundColor: colors.mat }} onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout)}>
      <ScrollView {...({ tabIndex: 0, role: 'group', 'aria-label': label } as object)} contentContainerStyle={{ padding: gap, alignItems: 'center' }}>
        {room.width > 0 ? (
          <View style={{ boxShadow: shadow.scan, borderRadius: radius.scan }}>
            <Image
              key={uri}
              source={{ uri }}
              accessibilityLabel={label}
              resizeMode="contain"
              style={{ width, height: width * ratio, borderRadius: radius.scan }}
            />
          </View>
        ) : null}
      </ScrollView>
    </View>
  );
}
