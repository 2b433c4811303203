import { useFonts as useExpoFonts } from 'expo-font';
import { faces } from './tokens';

/** Whether the shipped fonts are in; nothing is drawn in a fallback face before. */
export function useShippedFonts(): boolean {
  const [areLoaded, failure] = useExpoFonts({
    [faces.Next400]: require('../../assets/fonts/AtkinsonHyperlegibleNext_400Regular.ttf'),
    [faces.Next500]: require('../../assets/fonts/AtkinsonHyperlegibleNext_500Medium.ttf'),
    [faces.Next600]: require('../../assets/fonts/AtkinsonHyperlegibleNext_600SemiBold.ttf'),
    [faces.Mono400]: require('../../assets/fonts/AtkinsonHyperlegibleMono_400Regular.ttf'),
    [faces.Mono500]: require('../../assets/fonts/AtkinsonHyperlegibleMono_500Medium.ttf'),
    [faces.Mono600]: require('../../assets/fonts/AtkinsonHyperlegibleMono_600SemiBold.ttf'),
    [faces.Stix]: require('../../assets/fonts/STIXTwoText_400Regular_Italic.ttf'),
  });
  return areLoaded || failure !== null;
}
