/* The public face of the HTTP helpers for pages and endpoints. */
export { answer, json, localPath, refuse, seeOther, viaForm, type AnswerOptions } from './answer';
export { BODY_LIMIT, readBody, readSent } from './body';
export { etagOf, onceFrom, versionFrom, type Once } from './conditional';
export { type Context, type Sent } from './context';
export { makeLog, type Log } from './log';
export { shownFields, textWithLinks } from './typed';
export { ctxOf, siteActor, writeOf } from './site';
export { nested } from './nest';
export { problemDetails, problemResponse, type ProblemDetails } from './problem';
export { refusedForm, type Refused } from './refused';
