import type { Request } from 'express';
import { AppError } from '../errors.ts';

/** @throws {AppError} `sign_in_required` when nobody is signed in */
export function requireUser(req: Request): void {
  if (!req.user) throw new AppError('sign_in_required', 'Sign in first.');
}
