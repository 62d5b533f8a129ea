import type { Request } from 'express';

/** The id that the log line and the problem detail of one request share. */
export const requestIdOf = (request: Request): string => (typeof request.id === 'string' ? request.id : '');
