import type { ItemDraft, WorkedDraft } from '../../contracts/items';

/** Range texts come from the server, in plain decimals; they are compared for the order of rows only. */
const widthOf = (range: WorkedDraft['bands'][number] | undefined): number => (range ? Number(range.to) - Number(range.from) : Infinity);

/** The bands with the innermost first, as they nest; those without a range yet stay at the end. */
export function nested(draft: ItemDraft, worked: WorkedDraft): ItemDraft {
  if (worked.bands.length !== draft.bands.length) return draft;
  const order = draft.bands.map((band, index) => ({ band, index, width: widthOf(worked.bands[index]) }));
  order.sort((one, other) => (one.width === other.width ? one.index - other.index : one.width - other.width));
  return order.every(({ index }, at) => index === at) ? draft : { ...draft, bands: order.map(({ band }) => band) };
}
