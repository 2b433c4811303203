import { useEffect, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { PlaceBar } from './place-bar';
import type { Place } from './place';
import { PlaceRail, type Person } from './place-rail';
import { ScreenHead } from './screen-head';
import { SkipLink, contentId } from './skip-link';
import { useColors } from './theme';
import { useIsWide } from './use-breakpoint';

export interface ScreenFrameProps {
  /** Of the browser's window, and spoken. */
  readonly name: string;
  /** The heading, where it is more than the name. */
  readonly title?: ReactNode;
  readonly subtitle?: ReactNode;
  readonly back?: { readonly href: string; readonly label: string } | undefined;
  /** At the right of the head. */
  readonly actions?: ReactNode;
  /** The places of the rail; the first five are the bar of a phone. */
  readonly places?: readonly Place[] | undefined;
  /** At the foot of the rail, such as Settings. */
  readonly feet?: readonly Place[] | undefined;
  readonly person?: Person | undefined;
  /** Instead of the places in the rail: the burette of what is open. */
  readonly rail?: ReactNode;
  readonly isRailSlim?: boolean | undefined;
  /** A form or a desk hides the bar of a phone. */
  readonly isBarHidden?: boolean | undefined;
  /** Between head and content, such as chips; it does not scroll. */
  readonly strip?: ReactNode;
  /** Under the content, such as the keys or a phone's buttons; it does not scroll. */
  readonly foot?: ReactNode;
  /** A sheet beside the content on wide. */
  readonly side?: ReactNode;
  /** The screen scrolls its own parts. */
  readonly isFixed?: boolean | undefined;
  readonly isHeadHidden?: boolean | undefined;
  readonly ground?: 'paper' | 'bench' | undefined;
  readonly children: ReactNode;
}

/** What stands round a screen: on wide a rail and a head, on a phone a bar above and a bar of places below. */
export function ScreenFrame(props: ScreenFrameProps) {
  const { name, title, places = [], feet = [], isRailSlim = false, isFixed = false, ground = 'paper', children } = props;
  const colors = useColors();
  const isWide = useIsWide();
  useEffect(() => {
    document.title = `${name} – Meniscus`;
  }, [name]);
  const hasRail = isWide && (places.length > 0 || feet.length > 0 || props.rail !== undefined);
  const hasBar = !isWide && places.length > 1 && !props.isBarHidden;
  return (
    <View style={{ flex: 1, flexDirection: 'row', backgroundColor: colors[ground], minHeight: 0, overflow: 'hidden' }}>
      <SkipLink />
      {hasRail ? <PlaceRail places={places} feet={feet} person={props.person} rail={props.rail} isSlim={isRailSlim} /> : null}
      <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>
        {props.isHeadHidden ? null : <ScreenHead title={title ?? name} subtitle={props.subtitle} back={props.back} actions={props.actions} />}
        <View role="main" nativeID={contentId} tabIndex={-1} style={{ flex: 1, minHeight: 0, minWidth: 0, outlineWidth: 0 }}>
          {props.strip}
          {isFixed ? <View style={{ flex: 1, minHeight: 0, minWidth: 0 }}>{children}</View> : <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1 }}>{children}</ScrollView>}
          {props.foot}
        </View>
        {hasBar ? <PlaceBar places={places.slice(0, 5)} /> : null}
      </View>
      {props.side}
    </View>
  );
}
