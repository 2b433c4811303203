import { useEffect, useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useSignIn } from '../../client/session';
import { BrandMark } from '../../ui/brand-mark';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { EmptyScale } from './empty-scale';
import { words } from './words';

/** The door: e-mail, password, one button; on a wide screen an empty scale beside it. */
export function SignInScreen() {
  const colors = useColors();
  const isWide = useIsWide();
  useEffect(() => {
    document.title = `${words.name} – Meniscus`;
  }, []);
  return (
    <View role="main" style={{ flex: 1, flexDirection: 'row', backgroundColor: colors.paper }}>
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1, justifyContent: 'center', alignItems: isWide ? 'flex-end' : 'center', padding: 24 }}>
        <View style={{ width: '100%', maxWidth: 400, gap: 32 }}>
          <View style={{ gap: 12, alignItems: isWide ? 'flex-start' : 'center' }}>
            <BrandMark size={64} />
            <Text variant="display" level={1}>
              Meniscus
            </Text>
            <Text tone="ink2" align={isWide ? 'left' : 'center'}>
              {words.tagline}
            </Text>
          </View>
          <Form />
          <Text variant="small" tone="ink2" align={isWide ? 'left' : 'center'}>
            {words.intro}
          </Text>
        </View>
      </ScrollView>
      {isWide ? (
        <View style={{ flex: 1, justifyContent: 'center', paddingHorizontal: 64 }}>
          <EmptyScale />
        </View>
      ) : null}
    </View>
  );
}

function Form() {
  const signIn = useSignIn();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const isReady = email.trim() !== '' && password !== '';
  const submit = () => {
    if (isReady && !signIn.isPending) signIn.mutate({ email, password });
  };
  return (
    <View role="form" aria-label={words.name} style={{ gap: 16 }}>
      <Vessel label={words.email} value={email} onChange={setEmail} keyboard="email-address" autoComplete="username" onSubmit={submit} isFocusedFirst />
      <Vessel label={words.password} value={password} onChange={setPassword} isSecret autoComplete="current-password" onSubmit={submit} error={signIn.error?.message} />
      <Button kind="primary" isLarge isWide onPress={submit} isBusy={signIn.isPending}>
        {words.submit}
      </Button>
    </View>
  );
}
