import { FontDisplay, useFonts } from 'expo-font';
import { useEffect, useState } from 'react';
import mono400 from '../../assets/fonts/AtkinsonHyperlegibleMono_400Regular.ttf';
import mono500 from '../../assets/fonts/AtkinsonHyperlegibleMono_500Medium.ttf';
import mono600 from '../../assets/fonts/AtkinsonHyperlegibleMono_600SemiBold.ttf';
import next400 from '../../assets/fonts/AtkinsonHyperlegibleNext_400Regular.ttf';
import next500 from '../../assets/fonts/AtkinsonHyperlegibleNext_500Medium.ttf';
import next600 from '../../assets/fonts/AtkinsonHyperlegibleNext_600SemiBold.ttf';
import stix from '../../assets/fonts/STIXTwoText_400Regular_Italic.ttf';
import { faces } from './tokens';

/** NOTE `block` keeps a line empty until its face is in, so that no text is drawn twice in two widths. */
const blocking = (uri: number) => ({ uri, display: FontDisplay.BLOCK });

const first = {
  [faces.Next400]: blocking(next400),
  [faces.Next500]: blocking(next500),
  [faces.Next600]: blocking(next600),
  [faces.Mono500]: blocking(mono500),
};

const others = {
  [faces.Mono400]: blocking(mono400),
  [faces.Mono600]: blocking(mono600),
  [faces.Stix]: blocking(stix),
};

/**
 * Whether the faces of nearly all text are in; the rest, most of it symbols, arrives without holding up the page.
 * NOTE every face that is declared makes the browser forget the ones before it, so each is asked for once more when all are declared.
 */
export function useShippedFonts(): boolean {
  const [areDeclared, failure] = useFonts(first);
  useFonts(others);
  const [areIn, setIn] = useState(false);
  const isSettled = areDeclared || failure !== null;
  useEffect(() => {
    if (!isSettled) return undefined;
    let isHere = true;
    const done = () => {
      if (isHere) setIn(true);
    };
    Promise.all(Object.keys(first).map((face) => document.fonts.load(`16px "${face}"`))).then(done, done);
    return () => {
      isHere = false;
    };
  }, [isSettled]);
  return areIn;
}
