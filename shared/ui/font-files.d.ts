/** A font file as Metro bundles it: the number of the asset. */
declare module '*.ttf' {
  const asset: number;
  export default asset;
}
