/* The shape of a device in the invented site's own file. */
import { type DemoQ } from './demo-types';

export type DemoDevice = {
  tag: string;
  kind: string;
  subtype?: string;
  description: string;
  function?: string;
  role: string;
  service: string;
  balance: string;
  lift?: string;
  letter?: string;
  connections?: string;
  size_text?: string;
  seat?: string;
  bonnet?: string;
  bonnet_vent?: string;
  credited?: boolean;
  discharges_to: string;
  Kb_basis?: string;
  set_pressure?: DemoQ;
  set_vacuum?: DemoQ;
  full_flow_pressure?: DemoQ;
  full_flow_vacuum?: DemoQ;
  overpressure?: DemoQ;
  blowdown?: DemoQ;
  effective_area?: DemoQ;
  actual_area?: DemoQ;
  vacuum_flow_area?: DemoQ;
  K_certified?: DemoQ;
  Kb?: DemoQ;
  Kw?: DemoQ;
  Kc?: DemoQ;
  temperature_multiplier?: DemoQ;
  isolation?: { inlet: string; outlet: string };
  nameplate: {
    serial: string;
    year: number;
    code_symbol: string;
    cold_differential_test_pressure?: DemoQ;
    capacity_basis: string;
  };
  last_test?: {
    date: string;
    as_received_pop: DemoQ;
    as_left_pop: DemoQ;
    seat_leakage: string;
    interval_months: number;
  };
  discharge?: { to: string; location: string; evaluation: string };
  pilot?: { sensing: string; filter: string; backflow_preventer: string };
  actuation?: { signal: string; energy: string; fails: string };
  thermal_element?: { opens_at: DemoQ; full_open_at: DemoQ; note: string };
  rupture_disk_in_combination?: string | null;
  in_combination_with?: string;
  combination?: { combination_factor: DemoQ; space_between: string; fragmenting: boolean };
  burst?: {
    marked_burst_pressure: DemoQ;
    at_temperature: DemoQ;
    manufacturing_range: DemoQ;
    tolerance: DemoQ;
    lot: string;
    minimum_net_flow_area: DemoQ;
    resistance_factor?: DemoQ;
    installation?: string;
  };
};
