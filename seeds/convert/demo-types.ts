/* The shape of the invented site's own file, as far as the converter reads it. */
import { type DemoDevice } from './demo-device-types';

export { type DemoDevice } from './demo-device-types';

export type DemoOrigin = { kind: string; reference: string };
export type DemoQ = { value: number; unit: string; origin?: DemoOrigin };
/** An input of a load or sizing sheet: a figure, a word, a yes/no or a list of tags, each with its origin. */
export type DemoInput = { value: number | string | boolean | string[]; unit: string; origin?: DemoOrigin };

export type DemoSideFields = {
  fluid?: string;
  mawp?: DemoQ;
  design_temperature?: { max?: DemoQ; min?: DemoQ };
  operating?: { pressure?: DemoQ; temperature?: DemoQ };
  operating_pressure?: DemoQ;
};
export type DemoEquipment = DemoSideFields & {
  tag: string;
  kind: string;
  orientation?: string;
  vacuum_rating?: string;
  design_vacuum?: DemoQ;
  inside_diameter?: DemoQ;
  tangent_length?: DemoQ;
  length?: DemoQ;
  heads?: string;
  roof?: string;
  volume?: DemoQ;
  elevation_of_bottom?: DemoQ;
  levels?: { normal: DemoQ; high: DemoQ; fire: DemoQ };
  insulation?: { material: string; thickness?: DemoQ; fire_credit: boolean };
  tubes?: { count: number; inside_diameter: DemoQ };
  contents?: string;
  sides?: Record<string, DemoSideFields>;
  jacket?: DemoSideFields;
  coil?: DemoSideFields;
  rated_flow?: DemoQ;
  speed?: DemoQ;
  stages?: number;
  type?: string;
  trim?: { coefficient: DemoQ; xT: DemoQ; FL: DemoQ; travel_stop: string };
  origin: DemoOrigin;
};

export type DemoFluid = {
  id: string;
  name: string;
  phase: string;
  note?: string;
  state?: { pure: string; saturated_at: DemoQ };
} & Partial<Record<DemoFluidFigure, DemoQ>>;
export type DemoFluidFigure =
  | 'T'
  | 'M'
  | 'Z'
  | 'k'
  | 'latent_heat'
  | 'density_vapour'
  | 'density_liquid'
  | 'viscosity_vapour'
  | 'viscosity_liquid'
  | 'expansion_coefficient'
  | 'heat_capacity'
  | 'critical_pressure'
  | 'vapour_pressure'
  | 'v0'
  | 'v9';

export type DemoGroup = {
  id: string;
  devices: string[];
  credited: string[];
  spare: string[];
  disks?: string[];
  limiting_equipment: string;
  staggering: string;
  interlock: string | null;
};
export type DemoFitting = { name: string; count: number; K: number };
export type DemoSegment = {
  id: string;
  nominal: string;
  inside_diameter: DemoQ;
  length: DemoQ;
  roughness: DemoQ;
  fittings: DemoFitting[];
  carries?: string;
  from?: string;
  to?: string;
};
export type DemoLine = {
  id: string;
  device: string;
  side: 'inlet' | 'outlet';
  drawing: string;
  segments: DemoSegment[];
  starts_at?: string;
  ends_at?: {
    to: string;
    header?: string;
    tie_in?: string;
    equipment?: string;
    location?: string;
    nearest_access?: string;
    evaluation?: string;
    pressure?: DemoQ;
  };
};
export type DemoSheet = { method: string; inputs: Record<string, DemoInput> };
export type DemoAnswer = {
  group: string;
  fluid: string;
  accumulation: string;
  load: DemoSheet;
  sizing: DemoSheet;
};
export type DemoCause = { cause: string; disposition: string; reason: string; answers?: DemoAnswer[] };
export type DemoJustification = {
  rule: string;
  devices: string[];
  text: string;
  by: string;
  accepted_by: string;
  date: string;
};
export type DemoSystem = {
  id: string;
  name: string;
  unit: string;
  unit_system: 'SI' | 'US';
  service: string;
  boundary: string;
  revision: number;
  revision_history: { revision: number; issued: string; by_case: string; summary: string }[];
  equipment: DemoEquipment[];
  fluids: DemoFluid[];
  devices: DemoDevice[];
  groups: DemoGroup[];
  lines: DemoLine[];
  causes: DemoCause[];
  references: string[];
  assumptions: string[];
  shares: { with: string; what: string }[];
  justifications?: DemoJustification[];
};
export type DemoHeader = {
  id: string;
  name: string;
  service: string;
  disposes_to: string;
  unit: string;
  normal_pressure: DemoQ;
  gas_viscosity: DemoQ;
  limits: { Mach: DemoQ };
  note: string;
  segments: DemoSegment[];
  tie_ins: Record<string, string[]>;
  scenarios: {
    id: string;
    name: string;
    common_cause: string;
    members: { system: string; cause: string; group: string; tie_in: string }[];
  }[];
};
export type DemoPerson = { id: string; name: string; email: string; job: string; roles: string[] };
export type DemoSite = {
  as_of: string;
  caution: string;
  site: {
    id: string;
    name: string;
    tagline: string;
    operator: string;
    time_zone: string;
    elevation: DemoQ;
    barometric_pressure: DemoQ;
    story: string;
  };
  people: DemoPerson[];
  units: { id: string; name: string; unit_system: 'SI' | 'US' }[];
  headers: DemoHeader[];
  systems: DemoSystem[];
  cases: unknown[];
};

/** The stored results of one answer, as far as external sheets carry them. */
export type DemoAnswerResult = {
  group: string;
  relief_load: DemoQ;
  required_area: DemoQ;
  back_pressure_used: DemoQ;
  relieving_pressure: DemoQ;
  detail?: Record<string, unknown>;
};
/** Stored results of a system; `study` says who made the external sheets that carry them (the site's own when absent). */
export type DemoResults = {
  causes: Record<string, DemoAnswerResult[]>;
  devices: Record<string, Record<string, unknown>>;
  study?: string;
};
