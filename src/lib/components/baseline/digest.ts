/** A digest as people read it: groups of eight. */
export const groupedDigest = (digest: string) => digest.replace(/.{8}(?=.)/g, '$& ');

/** Its beginning, where it only says which. */
export const shortDigest = (digest: string) => digest.slice(0, 8);
