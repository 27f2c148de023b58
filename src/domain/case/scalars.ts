/* The plain words that the records of a case are made of. */

export type Id = string;
export type Path = string;
export type Hash = string;
export type SheetKey = string;
export type Day = string;
export type Instant = string;
/** Tiptap JSON; its nodes are cleaned by the text module before it is stored. */
export type Rich = { type: 'doc'; content: unknown[] };
