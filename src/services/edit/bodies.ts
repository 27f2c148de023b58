/* Bodies of the edits of a case as its forms send them, turned into what a program sends. */
import { z } from 'zod';
import { ACT_BODIES, briefOpsSchema, raiseSchema } from '@domain/case';
import { newId } from '@data/ids';

type Bag = Record<string, unknown>;

function bag(value: unknown): Bag | undefined {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Bag) : undefined;
}

function listOf(value: unknown): unknown[] {
  if (Array.isArray(value)) return value as unknown[];
  return value === undefined || value === '' ? [] : [value];
}

/** The form names one system, or none while it is not chosen. */
function raised(value: unknown): unknown {
  const body = bag(value);
  if (!body || 'systems' in body) return value;
  const { system, ...rest } = body;
  return { ...rest, systems: listOf(system) };
}

export const raiseBody = z.preprocess(raised, raiseSchema);

/** A row of papers that says nothing is no paper; blanks of the others were left out by the form. */
function paper(value: unknown): unknown[] {
  const row = bag(value);
  if (!row) return [value];
  if (row['kind'] === undefined && row['reference'] === undefined) return [];
  const none = row['kind'] === 'none' ? { reference: 'none touched', when: 'after', state: 'issued' } : {};
  return [{ id: newId('element'), from: '', to: '', ...none, ...row }];
}

/** A form says by `fields` which of the brief it carries: one that came without its value was emptied. */
function brief(value: unknown): unknown {
  const body = bag(value);
  if (!body || typeof body['fields'] !== 'string') return value;
  const { fields, ...rest } = body;
  const carried = String(fields).split(' ');
  const emptied = Object.fromEntries(
    carried.filter((name) => rest[name] === undefined).map((name) => [name, name === 'papers' ? [] : '']),
  );
  const full: Bag = { ...rest, ...emptied };
  if ('papers' in full) full['papers'] = listOf(full['papers']).flatMap(paper);
  return full;
}

export const briefBody = z.preprocess(brief, briefOpsSchema.strict());

/** The form has a field for each role: `seats.checker`, `seats.approver[]`, `seats.operations[]`. */
function seats(value: unknown): unknown {
  const body = bag(value);
  const byRole = bag(body?.['seats']);
  if (!body || !byRole) return value;
  const named = Object.entries(byRole).flatMap(([role, people]) =>
    listOf(people).map((person) => ({ role, person })),
  );
  return { ...body, seats: named };
}

export const seatsBody = z.preprocess(seats, ACT_BODIES.nominate);
