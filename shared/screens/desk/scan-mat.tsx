import { useLayoutEffect, useRef, useState } from 'react';
import { ScrollView, View } from 'react-native';
import { cropUrl } from '../../client/pictures';
import type { DeskLease } from '../../contracts/desk';
import { EyeLine } from '../../ui/eye-line';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { fitAlone, fitBeside, type Size } from './fit';
import { ScanPicture } from './scan-picture';
import { words } from './words';

interface ScanMatProps {
  readonly lease: DeskLease;
  readonly turns: number;
  /** 1 fits the room; more is closer. */
  readonly zoom: number;
}

const gap = 16;
/** The answer is what is read; the working helps. */
const answerShare = 0.56;

type Crop = DeskLease['crops'][number];

const turned = ({ widthPx, heightPx }: Crop, turns: number): Size => (turns % 2 === 1 ? { width: heightPx, height: widthPx } : { width: widthPx, height: heightPx });

/** The cut-outs of one answer on the mat: the working beside the box on wide, under it on a phone, the eye line across the box. */
export function ScanMat({ lease, turns, zoom }: ScanMatProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const [room, setRoom] = useState<Size>({ width: 0, height: 0 });
  const workings = lease.crops.filter(({ use }) => use === 'working');
  const answers = lease.crops.filter(({ use }) => use === 'answer');
  const inner = { width: Math.max(1, room.width - (isWide ? 64 : 0)), height: Math.max(1, room.height - (isWide ? 40 : 0)) };
  const shown = isWide ? [...workings, ...answers] : [...answers, ...workings];
  const scaleOf = (crop: Crop): number => {
    if (isWide) {
      const mine = shown.filter(({ use }) => use === crop.use);
      const share = shown.length === mine.length ? 1 : crop.use === 'answer' ? answerShare : 1 - answerShare;
      return fitBeside(mine.map((one) => turned(one, turns)), { width: (inner.width - gap) * share, height: inner.height }, gap) * zoom;
    }
    const share = workings.length === 0 ? 1 : 0.5;
    return fitAlone(turned(crop, turns), { width: inner.width, height: (inner.height - 6) * share }) * zoom;
  };
  const sizes = shown.map((crop): Size => {
    const { width, height } = turned(crop, turns);
    const scale = scaleOf(crop);
    return { width: Math.round(width * scale), height: Math.round(height * scale) };
  });
  // Closer is closer to the answer: what lies before it goes out of sight first.
  const along = useRef<ScrollView>(null);
  const before = isWide && zoom > 1 ? sizes.slice(0, workings.length).reduce((sum, { width }) => sum + width + gap, 0) : 0;
  useLayoutEffect(() => {
    along.current?.scrollTo({ x: before, animated: false });
  }, [before]);
  const between = 6;
  const tall = sizes.reduce((sum, { height }) => sum + height, 0) + between * (sizes.length - 1);
  const eyeAt = isWide || workings.length === 0 ? 0.5 : ((room.height - tall) / 2 + (sizes[0]?.height ?? 0) / 2) / Math.max(1, room.height);
  return (
    <View testID="mat" onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout)} style={{ flex: 1, minHeight: 0, backgroundColor: colors.mat, overflow: 'hidden' }}>
      {room.width > 0 ? (
        <ScrollView contentContainerStyle={{ flexGrow: 1 }}>
          <ScrollView ref={along} horizontal contentContainerStyle={{ flexGrow: 1, flexDirection: isWide ? 'row' : 'column', alignItems: 'center', justifyContent: 'center', gap: isWide ? gap : between, paddingHorizontal: isWide ? 32 : 0 }}>
            {shown.map((crop, index) => {
              const alt = crop.use === 'answer' ? words.answerPicture(lease.candidateNumber) : words.workingPicture(lease.candidateNumber);
              return <ScanPicture key={crop.box} src={cropUrl(lease.answerId, crop)} alt={alt} width={sizes[index]?.width ?? 0} height={sizes[index]?.height ?? 0} turns={turns} />;
            })}
          </ScrollView>
        </ScrollView>
      ) : null}
      {zoom === 1 ? <EyeLine at={eyeAt} /> : null}
    </View>
  );
}
