/** Identifiers such as CL-DN-004 do not break over lines. */
const IDENTIFIER = /([A-Z]{2,}(?:-[A-Z0-9]+)+)/;

/** The text in parts; every second one is an identifier. */
export const splitIdentifiers = (text: string): string[] => text.split(IDENTIFIER);
