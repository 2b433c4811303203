import { createContext, useContext, type ReactNode } from 'react';
import { Pressable, type PressableProps, type PressEvent } from './pressable';

type Navigate = (href: string) => void;

const NavigateContext = createContext<Navigate | null>(null);

/** Lets the links of the kit change the screen without loading the page again; `navigate` is the router's push. */
export function LinkProvider({ navigate, children }: { navigate: Navigate; children: ReactNode }) {
  return <NavigateContext.Provider value={navigate}>{children}</NavigateContext.Provider>;
}

export interface LinkProps extends Omit<PressableProps, 'onPress' | 'role' | 'href'> {
  readonly href: string;
}

/** A real link: it can be opened in another tab, copied, and is spoken as a link. */
export function Link({ href, ...rest }: LinkProps) {
  const follow = useFollow(href);
  return <Pressable {...rest} role="link" href={href} onPress={follow} />;
}

/** What pressing a link does: the router goes there, unless the browser was asked for another tab or window. */
export function useFollow(href: string): (event: PressEvent) => void {
  const navigate = useContext(NavigateContext);
  return (event) => {
    const { ctrlKey, metaKey, shiftKey } = event.nativeEvent as Partial<MouseEvent>;
    if (!navigate || ctrlKey || metaKey || shiftKey) return;
    event.preventDefault();
    navigate(href);
  };
}
