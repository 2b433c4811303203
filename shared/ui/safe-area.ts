/** Room for what a phone draws over the foot of the screen. NOTE a length only the browser knows, typed as the number React Native asks for. */
export const safeFoot = 'env(safe-area-inset-bottom, 0px)' as unknown as number;
