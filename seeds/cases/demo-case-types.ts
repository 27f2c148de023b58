/* The shape of a case in the invented site's own file, as far as it is read. */
import { type DemoQ } from '../convert';

export type DemoChange = { system: string; path: string[]; label: string; old: unknown; new: unknown };
export type DemoAffected = {
  system: string;
  why: string;
  reviewed: boolean;
  changes: DemoChange[];
  verdict: string | null;
};
export type DemoPost = { at: string; person: string; text: string };
export type DemoFinding = {
  number: number;
  raised_by: string;
  must_fix: boolean;
  place: string;
  state: 'open' | 'answered' | 'closed';
  text: string;
  thread: DemoPost[];
};
export type DemoUnseen = {
  sheet: string;
  figure: string;
  checker_value: DemoQ;
  round: number;
  by: string;
  at: string;
  note: string | null;
};
export type DemoFieldLine = {
  group: string;
  item: string;
  required: string;
  found: string;
  result: string;
  photo: string | null;
  initials: string;
};
export type DemoDiscrepancy = {
  number: string;
  device: string;
  item: string;
  holds_start_up: boolean;
  state: string;
  owner: string;
  thread: DemoPost[];
};
export type DemoPaper = { kind: string; reference: string; from: string; to: string; state: string };
export type DemoLive = {
  text: string;
  state: 'before' | 'after';
  sheet: string;
  key: string;
  decimals: number;
};
export type DemoCase = {
  id: string;
  title: string;
  class: string;
  stage: string;
  systems: string[];
  raised_on: string;
  time_needed: string;
  starts?: string;
  end: string | null;
  nominated: { originator: string; checker: string; approvers: string[]; operations: string };
  what_changes: string;
  technical_basis: string;
  effect_on_safety_and_health: string;
  procedures: DemoPaper[];
  drawings: DemoPaper[];
  changes: DemoChange[];
  ripple: DemoAffected[];
  findings: DemoFinding[];
  blind_check: DemoUnseen[];
  ticks?: { sheet: string; by: string; at: string; state: string }[];
  conditions: { number: number; by: string; at: string; text: string; becomes: string }[];
  signoffs: { gate: string; person: string; role: string; meaning: string; at: string }[];
  field_sheet: {
    filled_by: string;
    on: string;
    devices: Record<string, DemoFieldLine[]>;
    discrepancies: DemoDiscrepancy[];
  } | null;
  pssr?: { number: number; point: string; state: string; by: string }[];
  startup_actions: { text: string; owner: string; due: string; state: string }[];
  open_points: { code: string; sentence: string; where: string }[];
  events: { at: string; person: string; event: string; text: string }[];
  notices: { to: string[]; at: string; subject: string; state: string }[];
  live_figures: DemoLive[];
  returned?: { from: string; to: string; by: string; at: string; reason: string }[];
  withdrawal?: { by: string; at: string; from_stage: string; reason: string };
  refusal?: { by: string; at: string; reason: string };
  restore?: { to_revision: number; how: string };
  issued_revision?: { system: string; revision: number; at: string };
  authorised_by?: string;
  emergency?: {
    authorised_at: string;
    authorised_by: string;
    authorisation: string;
    acted_at: string;
    acted_by: string;
    debt_due: string;
  };
};
