/* The public face of rich text. */
export * from './clean';
export { DEEPEST_NODE, LONGEST_TEXT, MARKS, NODES, faultOfRich, type RichMark, type RichNode } from './nodes';
export * from './read';
export * from './schema';
