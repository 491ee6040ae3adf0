/** Stored with every result and trail entry. Equal to the package's version; a test holds the two together. */
export const engineVersion = '0.1.0';
