import { readdir } from 'node:fs/promises';
import path from 'node:path';
import type { Contract } from '../../shared/api/contract.ts';

const API = path.resolve(import.meta.dirname, '../../shared/api');

/** Every contract that shared/api declares, found by looking, so that a new one cannot be forgotten. */
export async function everyContract(): Promise<Contract[]> {
  const contracts: Contract[] = [];
  for (const file of await readdir(API)) {
    const module = (await import(path.join(API, file))) as Record<string, Record<string, Contract>>;
    for (const [name, value] of Object.entries(module)) {
      if (name.endsWith('Contracts')) contracts.push(...Object.values(value));
    }
  }
  return contracts;
}
