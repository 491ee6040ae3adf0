/** A font file as a data URI; the bundler and the test runner put the bytes in. */
declare module '*.woff2?inline' {
  const dataUri: string;
  export default dataUri;
}
