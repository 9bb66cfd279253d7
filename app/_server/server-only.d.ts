// Next resolves this marker by itself and ships no types for it.
declare module 'server-only';
