import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { useMe, useSignOut } from '../../client/session';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { usePreference } from '../../ui/preferences';
import { ScreenFrame } from '../../ui/screen-frame';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { themePreferences, useColors, useTheme } from '../../ui/theme';
import { homePlaces } from '../frame/home-places';
import { fonts, words } from './words';

/** Own ways of working, sessions, licences. */
export function SettingsScreen() {
  const { data: me } = useMe();
  const { preference, setPreference } = useTheme();
  const [letters, setLetters] = usePreference('letters');
  const [actions, setActions] = usePreference('actions');
  const signOut = useSignOut();
  const [isAsking, setAsking] = useState(false);
  return (
    <ScreenFrame name={words.title} subtitle={words.subtitle} places={homePlaces('settings')}>
      <View style={{ padding: 24, gap: 32, maxWidth: 620 }}>
        <Section title={words.own}>
          <Select label={words.theme} value={preference} onChange={setPreference} options={themePreferences.map((value) => ({ value, label: words.themes[value] }))} testID="theme" />
          <Select label={words.letters} help={words.lettersHelp} value={letters} onChange={setLetters} options={(['on', 'alt', 'off'] as const).map((value) => ({ value, label: words.lettersChoices[value] }))} />
          <Select label={words.actions} value={actions} onChange={setActions} options={(['right', 'left'] as const).map((value) => ({ value, label: words.sides[value] }))} />
        </Section>
        <Section title={words.sessions}>
          <Text>{words.signedInAs(me?.name ?? '')}</Text>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
            <Button icon="out" onPress={() => signOut.mutate('here')} isBusy={signOut.isPending}>
              {words.here}
            </Button>
            <Button onPress={() => setAsking(true)}>{words.everywhere}</Button>
          </View>
        </Section>
        <Section title={words.licences}>
          <Text>{words.fonts}</Text>
          {fonts.map(({ name, by }) => (
            <View key={name}>
              <Text weight={600}>{name}</Text>
              <Text variant="small" tone="ink2">
                {by}
              </Text>
            </View>
          ))}
        </Section>
      </View>
      {isAsking ? (
        <Dialog
          title={words.everywhereTitle}
          onClose={() => setAsking(false)}
          actions={
            <>
              <Button kind="primary" onPress={() => signOut.mutate('everywhere')} isBusy={signOut.isPending}>
                {words.everywhere}
              </Button>
              <Button onPress={() => setAsking(false)}>{words.stay}</Button>
            </>
          }
        >
          <Text>{words.everywhereText}</Text>
        </Dialog>
      ) : null}
    </ScreenFrame>
  );
}

function Section({ title, children }: { title: string; children: ReactNode }) {
  const colors = useColors();
  return (
    <View style={{ gap: 14, borderTopWidth: 1, borderColor: colors.hair, paddingTop: 16 }}>
      <Text variant="head" level={2}>
        {title}
      </Text>
      {children}
    </View>
  );
}
