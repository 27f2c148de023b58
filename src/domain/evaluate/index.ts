/* The public face of evaluation: from a relief basis to sheets, verdicts and flat figures. */
export * from './types';
