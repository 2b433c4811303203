import { useState } from 'react';
import { View } from 'react-native';
import { cropUrl } from '../../client/pictures';
import type { AnswerView } from '../../contracts/ledger';
import { useColors } from '../../ui/theme';
import { CheckPosition } from '../check-position';
import { PageOnMat } from '../page-on-mat';
import { fitAlone } from '../desk/fit';
import { ScanPicture } from '../desk/scan-picture';

const tallest = { answer: 190, working: 150 } as const;

/** The cut-outs of an answer on the mat: its box, then its working. */
export function Crops({ answer }: { answer: AnswerView }) {
  const colors = useColors();
  const [width, setWidth] = useState(0);
  const [isWhole, setWhole] = useState(false);
  const shown = [...answer.crops].sort((one, other) => (one.use === other.use ? 0 : one.use === 'answer' ? -1 : 1));
  if (shown.length === 0) return null;
  const { pageImageId, pageImageRev, pageNo } = answer;
  const isDoubtful = pageImageId !== null && shown.some((crop) => crop.isDoubtful);
  return (
    <View>
      <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ backgroundColor: colors.mat, padding: 16, gap: 10, alignItems: 'center', minHeight: 120 }}>
        {width > 0
          ? shown.map((crop) => {
              const size = { width: crop.widthPx, height: crop.heightPx };
              const scale = fitAlone(size, { width: width - 32, height: tallest[crop.use] });
              return <ScanPicture key={crop.box} src={cropUrl(answer.answerId, crop)} alt={`${crop.use === 'answer' ? 'Answer box' : 'Working'} of ${answer.candidateNumber}`} width={Math.round(size.width * scale)} height={Math.round(size.height * scale)} turns={0} />;
            })
          : null}
      </View>
      {isDoubtful ? <CheckPosition isWhole={isWhole} onWhole={() => setWhole(!isWhole)} /> : null}
      {isDoubtful && isWhole ? (
        <View style={{ height: 460 }}>
          <PageOnMat id={pageImageId} rev={pageImageRev} label={`Page ${pageNo ?? ''} of ${answer.candidateNumber}`} isWhole={false} />
        </View>
      ) : null}
    </View>
  );
}
