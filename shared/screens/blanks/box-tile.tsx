import { useState, type Ref } from 'react';
import { View } from 'react-native';
import { cropUrl } from '../../client/pictures';
import type { DeskLease } from '../../contracts/desk';
import { Icon } from '../../ui/icon';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { line, radius } from '../../ui/tokens';
import { ScanPicture } from '../desk/scan-picture';
import { words } from './words';

interface BoxTileProps {
  readonly lease: DeskLease;
  readonly width: number;
  readonly isBlank: boolean;
  /** The one of the sheet that the tab key reaches. */
  readonly isCurrent: boolean;
  readonly host: Ref<View>;
  readonly onToggle: () => void;
  readonly onKey: (press: { readonly key: string; preventDefault(): void }) => void;
  readonly onFocus: () => void;
}

/** One box of the sheet: its picture, whose it is, and whether it counts as blank. */
export function BoxTile({ lease, width, isBlank, isCurrent, host, onToggle, onKey, onFocus }: BoxTileProps) {
  const colors = useColors();
  const [isHovered, setHovered] = useState(false);
  const pictures = [...lease.crops].sort((one, other) => one.use.localeCompare(other.use));
  const inner = Math.max(1, width - 2 * 6);
  // NOTE a plain view: the pressable of the kit keeps Enter for itself, which here records the sheet.
  const web = { role: 'checkbox', tabIndex: isCurrent ? 0 : -1, 'aria-checked': isBlank, 'aria-label': words.box(lease.candidateNumber), onClick: onToggle, onKeyDown: onKey, onFocus, onMouseEnter: () => setHovered(true), onMouseLeave: () => setHovered(false) };
  return (
    <View
      ref={host}
      {...(web as object)}
      testID={`box-${lease.candidateNumber}`}
      style={{ width, padding: 6, gap: 6, borderRadius: radius.control, borderWidth: line.control, borderColor: isBlank ? colors.hair : colors.iodine, backgroundColor: isBlank ? (isHovered ? colors.well : colors.paper) : colors.iodineFaint, cursor: 'pointer' }}
    >
      <View aria-hidden style={{ backgroundColor: colors.mat, borderRadius: radius.scan, gap: 4 }}>
        {pictures.map((crop) => (
          <ScanPicture key={crop.box} src={cropUrl(lease.answerId, crop)} alt={words.picture(crop.use, lease.candidateNumber)} width={inner} height={Math.round((inner * crop.heightPx) / Math.max(1, crop.widthPx))} turns={0} />
        ))}
      </View>
      <View style={{ minHeight: 24, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 6 }}>
        <Text variant="body" weight={600} isTabular style={{ flex: 1 }}>
          {lease.candidateNumber}
        </Text>
        {isBlank ? <Icon name="check" size={16} tone="manganate" /> : null}
        <Text variant="small" tone={isBlank ? 'ink2' : 'iodine'} weight={isBlank ? 400 : 600}>
          {isBlank ? words.blank : words.toDesk}
        </Text>
      </View>
    </View>
  );
}
