export const ENGINE_VERSION = '1';
