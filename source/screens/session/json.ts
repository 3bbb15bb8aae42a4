/** JSON by path is the documents' own matter; the session speaks of it everywhere. */
export * from '../../documents/json.ts';
